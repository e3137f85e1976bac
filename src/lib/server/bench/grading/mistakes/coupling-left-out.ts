import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { withLoss } from '../spoil';

/** The coupler's coupling not added back: the level at its port reported as that in the main line. */
export const couplingLeftOut = defineMistake(
	'coupling-left-out',
	z.strictObject({ lossDb: z.number().positive() }),
	({ lossDb }) => ({
		stage: 'slip',
		label: 'coupling left out',
		phrase: 'left the coupling out',
		change: () => -lossDb,
		explain({ question, drawn, yours }) {
			const coupling = shortFigure(lossDb, 2);
			return {
				title: 'The port carries a sample, not the line',
				text: `A coupler hands out a small part of what passes: here ${coupling} dB less than the main line. Your number is the level at its port; your order asks for the level at ${drawn.brief.plane}.`,
				sum: `${figure(yours, question.digits)} + ${coupling} = ${figure(yours + lossDb, question.digits)} ${question.unit}`,
				part: 'the coupling, not added back',
				bad: { at: 'answer', text: `Here: the answer is without the coupler’s ${coupling} dB` }
			};
		},
		make: (steps, { question }) => withLoss(steps, question.id, -lossDb)
	})
);
