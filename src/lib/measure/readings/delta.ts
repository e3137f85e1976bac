/** The difference between two markers. */
import { levelSpreadDb } from '../line-level';
import { pointTimeS } from '../noise-statistics';
import { pointAt } from '../place';
import type { Reader } from '../reader';
import { lineRemarks, once } from '../remarks';
import { isZeroSpan, stepHz } from '../trace';

export const delta: Reader<'delta'> = (trace, { fromHz, toHz, fromS, toS }) => {
	const from = pointAt(trace, fromHz, fromS);
	if (typeof from === 'object') return from;
	const to = pointAt(trace, toHz, toS);
	if (typeof to === 'object') return to;
	const [fromDbm, toDbm] = [trace.levelsDbm[from], trace.levelsDbm[to]];
	const steps = to - from;
	const distance = isZeroSpan(trace)
		? { timeS: steps * pointTimeS(trace) }
		: { frequencyHz: steps * stepHz(trace) };
	return {
		value: toDbm - fromDbm,
		unit: 'dB',
		spread: Math.hypot(levelSpreadDb(trace, from), levelSpreadDb(trace, to)),
		remarks: once([...lineRemarks(trace, from), ...lineRemarks(trace, to)]),
		parts: { ...distance, fromDbm, toDbm }
	};
};
