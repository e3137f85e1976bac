/** The level where a marker stands. */
import { levelSpreadDb } from '../line-level';
import { placeOf, pointAt } from '../place';
import { type Reader } from '../reader';
import { lineRemarks } from '../remarks';

export const marker: Reader<'marker'> = (trace, { atHz, atS }) => {
	const index = pointAt(trace, atHz, atS);
	if (typeof index === 'object') return index;
	return {
		value: trace.levelsDbm[index],
		unit: 'dBm',
		spread: levelSpreadDb(trace, index),
		remarks: lineRemarks(trace, index),
		parts: placeOf(trace, index)
	};
};
