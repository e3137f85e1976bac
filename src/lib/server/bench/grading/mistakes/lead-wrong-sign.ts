import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { correctsOnBench, withSettings, withSum } from '../spoil';

/** The lead's loss taken off the reading instead of added to it: low by twice the loss. */
export const leadWrongSign = defineMistake('lead-wrong-sign', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'lead taken off twice',
	phrase: 'took the lead off where it should be added',
	change: ({ question }) => -2 * question.leadDb,
	explain({ question, drawn, yours }) {
		const lead = shortFigure(question.leadDb, 2);
		const atReceiver = yours + question.leadDb;
		return {
			title: 'A loss is added back, not taken off',
			text: `The signal is stronger at ${drawn.brief.plane} than at the receiver, because the lead has already lost ${lead} dB of it. Taking ${lead} dB off once more leaves you ${shortFigure(2 * question.leadDb, 2)} dB low.`,
			sum: `${figure(yours, question.digits)} + ${lead} = ${figure(atReceiver, question.digits)} at the receiver, + ${lead} = ${figure(atReceiver + question.leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, taken off instead of added',
			bad: { at: 'answer', text: `Here: the lead’s ${lead} dB went in with the wrong sign` }
		};
	},
	make: (steps, { question }) =>
		correctsOnBench(steps)
			? withSettings(steps, { correctionDb: -question.leadDb })
			: withSum(steps, question.id, (value) => value - 2 * question.leadDb)
}));
