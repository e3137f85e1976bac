/** Margin to a limit, dB: the worst over all segments; positive passes. */
import { levelSpreadDb } from '../line-level';
import type { LimitSegment } from '../reading-request';
import { needsSpan, outsideTrace, type Reader } from '../reader';
import { lineRemarks, outsideRemark } from '../remarks';
import { covers, frequencyAt, isZeroSpan, nearestPoint, positionOf, type Trace } from '../trace';

export const mask: Reader<'mask'> = (trace, { limits }) => {
	if (isZeroSpan(trace)) return needsSpan();
	const margins = limits.flatMap((limit, segment) => worstMargin(trace, limit, segment) ?? []);
	if (margins.length === 0) return outsideTrace('Every segment of the mask');
	const worst = margins.reduce((a, b) => (b.marginDb < a.marginDb ? b : a));
	const whole = limits.every(({ startHz, stopHz }) => covers(trace, startHz) && covers(trace, stopHz));
	return {
		value: worst.marginDb,
		unit: 'dB',
		spread: levelSpreadDb(trace, worst.index),
		remarks: [...lineRemarks(trace, worst.index), ...(whole ? [] : [outsideRemark()])],
		parts: { segment: worst.segment, frequencyHz: frequencyAt(trace, worst.index), marginDb: worst.marginDb }
	};
};

interface Margin {
	segment: number;
	index: number;
	marginDb: number;
}

function worstMargin(
	trace: Trace,
	{ startHz, stopHz, levelDbm }: LimitSegment,
	segment: number
): Margin | null {
	const last = trace.levelsDbm.length - 1;
	const from = Math.max(0, Math.ceil(positionOf(trace, startHz) - 1e-9));
	const to = Math.min(last, Math.floor(positionOf(trace, stopHz) + 1e-9));
	let worst: Margin | null = null;
	for (let index = from; index <= to; index++) {
		const marginDb = levelDbm - trace.levelsDbm[index];
		if (!worst || marginDb < worst.marginDb) worst = { segment, index, marginDb };
	}
	if (worst || !covers(trace, (startHz + stopHz) / 2)) return worst;
	// A segment narrower than a step falls between two points: the nearest speaks for it.
	const index = nearestPoint(trace, (startHz + stopHz) / 2);
	return { segment, index, marginDb: levelDbm - trace.levelsDbm[index] };
}
