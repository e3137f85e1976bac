/** The highest point of the trace. */
import { highestPoint } from '../find-peaks';
import { levelSpreadDb } from '../line-level';
import { placeOf } from '../place';
import type { Reader } from '../reader';
import { lineRemarks } from '../remarks';
import { remark } from '../remark';

export const peak: Reader<'peak'> = (trace) => {
	const index = highestPoint(trace.levelsDbm);
	const atEdge = index === 0 || index === trace.levelsDbm.length - 1;
	const edge = remark(
		'peak-at-edge',
		'The highest point is the first or last of the trace: what it belongs to may lie outside.'
	);
	return {
		value: trace.levelsDbm[index],
		unit: 'dBm',
		spread: levelSpreadDb(trace, index),
		remarks: [...lineRemarks(trace, index), ...(atEdge ? [edge] : [])],
		parts: placeOf(trace, index)
	};
};
