/** The nearest peak on one side of a marker: out of the trace by the excursion, and out of its noise unless a threshold is given. */
import { nextPeak as findNextPeak } from '../find-peaks';
import { levelSpreadDb } from '../line-level';
import { aboveNoiseDbm } from '../line-spectrum';
import { placeOf } from '../place';
import { needsSpan, noNumber, outsideTrace, type Reader } from '../reader';
import { lineRemarks } from '../remarks';
import { covers, isZeroSpan, nearestPoint } from '../trace';

export const nextPeak: Reader<'next-peak'> = (trace, { fromHz, side, thresholdDbm, excursionDb = 6 }) => {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, fromHz)) return outsideTrace(`${fromHz} Hz`);
	const index = findNextPeak(trace.levelsDbm, nearestPoint(trace, fromHz), side, {
		thresholdDbm: thresholdDbm ?? aboveNoiseDbm(trace),
		excursionDb
	});
	if (index === null) {
		const floor = thresholdDbm === undefined ? ' and its noise' : `, ${thresholdDbm} dBm or more`;
		return noNumber(
			`On the ${side} side no peak stands ${excursionDb} dB out of the trace${floor}.`,
			'a lower threshold, a smaller excursion or a wider span'
		);
	}
	return {
		value: trace.levelsDbm[index],
		unit: 'dBm',
		spread: levelSpreadDb(trace, index),
		remarks: lineRemarks(trace, index),
		parts: placeOf(trace, index)
	};
};
