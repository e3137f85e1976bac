import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { withLoss } from '../spoil';

/** The coupling taken off instead of added back: low by twice the coupling. */
export const couplingWrongSign = defineMistake(
	'coupling-wrong-sign',
	z.strictObject({ lossDb: z.number().positive() }),
	({ lossDb }) => ({
		stage: 'slip',
		label: 'coupling taken off',
		phrase: 'took the coupling off where it should be added',
		change: () => -2 * lossDb,
		explain({ question, drawn, yours }) {
			const coupling = shortFigure(lossDb, 2);
			const twice = shortFigure(2 * lossDb, 2);
			return {
				title: 'The line is stronger than the port',
				text: `The coupler’s port stands ${coupling} dB below the main line, so the level at ${drawn.brief.plane} is that much higher than at the port. Taking ${coupling} dB off where they should be added leaves you ${twice} dB low.`,
				sum: `${figure(yours, question.digits)} + ${twice} = ${figure(yours + 2 * lossDb, question.digits)} ${question.unit}`,
				part: 'the coupling, taken off instead of added',
				bad: { at: 'answer', text: `Here: the coupler’s ${coupling} dB went in with the wrong sign` }
			};
		},
		make: (steps, { question }) => withLoss(steps, question.id, -2 * lossDb)
	})
);
