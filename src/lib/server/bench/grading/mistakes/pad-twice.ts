import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { padIn, padOf } from '../pad-of';
import { withSum } from '../spoil';

/** The pad in the correction, and added once more by hand. */
export const padTwice = defineMistake('pad-twice', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'pad added twice',
	phrase: 'added your pad twice',
	change: (_, setUp) => (padOf(setUp) > 0 ? padOf(setUp) : null),
	explain({ question, setUp, yours }) {
		const padDb = padOf(setUp);
		return {
			title: 'The pad counts once',
			text: `Your pad takes ${padDb} dB off, once. Whether Correction adds it back or you do by hand, it goes into the sum a single time.`,
			sum: `${figure(yours, question.digits)} − ${padDb} = ${figure(yours - padDb, question.digits)} ${question.unit}`,
			part: `your ${padDb} dB pad, added a second time`,
			bad: { at: 'answer', text: `Here: the pad’s ${padDb} dB was in the number already` }
		};
	},
	make: (steps, context) => withSum(steps, context.question.id, (value) => value + padIn(steps, context))
}));
