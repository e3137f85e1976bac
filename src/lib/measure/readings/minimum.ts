/** The lowest point of the trace. */
import { lowestPoint } from '../find-peaks';
import { levelSpreadDb } from '../line-level';
import { placeOf } from '../place';
import type { Reader } from '../reader';

export const minimum: Reader<'minimum'> = (trace) => {
	const index = lowestPoint(trace.levelsDbm);
	return {
		value: trace.levelsDbm[index],
		unit: 'dBm',
		spread: levelSpreadDb(trace, index),
		remarks: [],
		parts: placeOf(trace, index)
	};
};
