import { z } from 'zod';
import { onAndPeriodS, shortTime } from '../on-and-period';
import { defineMistake } from '../mistake';
import { withSum } from '../spoil';

/** The time from one start to the next given as how long something stays on. */
export const periodForOnTime = defineMistake('period-for-on-time', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'period',
	phrase: 'gave the time from start to start',
	change(context) {
		const { onS, periodS } = onAndPeriodS(context);
		return periodS - onS;
	},
	explain({ yours, ...context }) {
		const { onS, periodS } = onAndPeriodS(context);
		return {
			title: 'From start to start is the period',
			text: `It starts every ${shortTime(periodS)}, and that is what you gave. It stays on for ${shortTime(onS)} of them, from a rise to the next fall.`,
			sum: `${shortTime(yours)} − ${shortTime(periodS - onS)} of silence = ${shortTime(yours - periodS + onS)}`,
			part: 'the silence, counted in',
			bad: { at: 'answer', text: 'Here: the period, not the time it is on' }
		};
	},
	make(steps, context) {
		const { onS, periodS } = onAndPeriodS(context);
		return withSum(steps, context.question.id, (value) => value + periodS - onS);
	}
}));
