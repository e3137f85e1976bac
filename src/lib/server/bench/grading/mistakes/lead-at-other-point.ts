import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { defineMistake, type Context } from '../mistake';
import { withLoss } from '../spoil';

/** What the lead loses at another frequency of its table, dB. */
const lossAt = ({ drawn }: Context, atHz: number): number =>
	drawn.scene.path ? lossDbAt(drawn.scene.path, atHz) : 0;

/** The lead's loss at one point of its table taken as it stands, where the frequency measured lies between two. */
export const leadAtOtherPoint = defineMistake(
	'lead-at-other-point',
	z.strictObject({ atHz: z.number().positive() }),
	({ atHz }) => ({
		stage: 'slip',
		label: `loss at ${formatFrequency(atHz)}`,
		phrase: `took the lead’s loss at ${formatFrequency(atHz)}`,
		change: (context) => lossAt(context, atHz) - context.question.leadDb,
		explain({ question, drawn, yours }) {
			const usedDb = lossAt({ question, drawn }, atHz);
			const changeDb = question.leadDb - usedDb;
			return {
				title: 'A loss belongs to a frequency',
				text: `The table says ${shortFigure(usedDb, 2)} dB at ${formatFrequency(atHz)}. You measured at ${formatFrequency(question.frequencyHz)}, between two of its points: on the straight line between them the lead loses ${figure(question.leadDb, 2)} dB.`,
				sum: `${figure(yours, question.digits)} ${changeDb < 0 ? '−' : '+'} ${figure(Math.abs(changeDb), 2)} = ${figure(yours + changeDb, question.digits)} ${question.unit}`,
				part: `the lead at ${formatFrequency(atHz)} instead of where you measured`,
				bad: { at: 'answer', text: `Here: the loss at ${formatFrequency(atHz)}, not at the carrier` }
			};
		},
		make: (steps, context) =>
			withLoss(steps, context.question.id, lossAt(context, atHz) - context.question.leadDb)
	})
);
