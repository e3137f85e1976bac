import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { withSum } from '../spoil';

/** The preamplifier's gain taken off a level that the receiver has already brought back to its connector. */
export const gainTakenOff = defineMistake('gain-taken-off', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'gain taken off',
	phrase: 'took the preamplifier’s gain off',
	change: ({ drawn }) => -(drawn.profile.preamp?.gainDb ?? 0),
	explain({ drawn, question, yours }) {
		const gainDb = drawn.profile.preamp?.gainDb ?? 0;
		const gain = shortFigure(gainDb, 2);
		return {
			title: 'The screen has taken the gain off already',
			text: `The receiver knows its preamplifier. Every level on the bench is that at the connector, with the ${gain} dB already taken off. Taking them off by hand counts them twice.`,
			sum: `${figure(yours, question.digits)} + ${gain} = ${figure(yours + gainDb, question.digits)} ${question.unit}`,
			part: 'the preamplifier’s gain, taken off twice',
			bad: { at: 'answer', text: `Here: the preamplifier’s ${gain} dB was off already` }
		};
	},
	make: (steps, { drawn, question }) =>
		withSum(steps, question.id, (value) => value - (drawn.profile.preamp?.gainDb ?? 0))
}));
