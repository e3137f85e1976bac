/** Where markers stand: on points, by frequency, or by time in span 0. */
import { pointTimeS, sweepTimeS } from './noise-statistics';
import { noNumber, outsideTrace, type NoNumber } from './reader';
import type { Place } from './reading';
import { covers, frequencyAt, isZeroSpan, nearestPoint, type Trace } from './trace';

/** Frequency of a point, or its time from the start of the sweep in span 0. */
export const placeOf = (trace: Trace, index: number): Place =>
	isZeroSpan(trace) ? { timeS: index * pointTimeS(trace) } : { frequencyHz: frequencyAt(trace, index) };

/** The point that a marker asked for at a frequency, or a time in span 0, stands on. */
export function pointAt(trace: Trace, atHz?: number, atS?: number): number | NoNumber {
	if (isZeroSpan(trace)) {
		if (atS === undefined) return noNumber('In span 0 every point stands at one frequency.', 'a time, atS');
		if (atS < 0 || atS > sweepTimeS(trace) * (1 + 1e-9)) return outsideTrace(`${atS} s`);
		return Math.min(trace.levelsDbm.length - 1, Math.round(atS / pointTimeS(trace)));
	}
	if (atHz === undefined)
		return noNumber('This trace runs over frequency, not time.', 'a frequency, or span 0');
	return covers(trace, atHz) ? nearestPoint(trace, atHz) : outsideTrace(`${atHz} Hz`);
}
