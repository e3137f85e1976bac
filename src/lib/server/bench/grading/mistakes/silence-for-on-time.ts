import { z } from 'zod';
import { onAndPeriodS, shortTime } from '../on-and-period';
import { defineMistake } from '../mistake';
import { withSum } from '../spoil';

/** The silence between two bursts given as how long one stays on. */
export const silenceForOnTime = defineMistake('silence-for-on-time', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'silence',
	phrase: 'gave the silence between',
	change(context, _, source) {
		const { onS, periodS } = onAndPeriodS(context);
		return periodS - 2 * (source?.cleanValue ?? onS);
	},
	explain({ yours, ...context }) {
		const { onS, periodS } = onAndPeriodS(context);
		return {
			title: 'That is how long it stays away',
			text: `From a fall to the next rise nothing is on: ${shortTime(periodS - onS)}. It stays on from a rise to the next fall.`,
			sum: `period ${shortTime(periodS)} − your ${shortTime(yours)} = ${shortTime(periodS - yours)} on`,
			part: 'the silence, taken for the burst',
			bad: { at: 'answer', text: 'Here: the silence, not the time it is on' }
		};
	},
	make(steps, context) {
		const { periodS } = onAndPeriodS(context);
		return withSum(steps, context.question.id, (value) => periodS - value);
	}
}));
