import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { leadLoss } from '../lead-loss';
import { defineMistake } from '../mistake';
import { withLoss } from '../spoil';

/** The lead's loss taken off the reading instead of added to it: low by twice the loss. */
export const leadWrongSign = defineMistake('lead-wrong-sign', leadLoss, ({ lossDb }) => ({
	stage: 'slip',
	label: 'lead taken off twice',
	phrase: 'took the lead off where it should be added',
	change: ({ question }) => -2 * (lossDb ?? question.leadDb),
	explain({ question, drawn, yours }) {
		const leadDb = lossDb ?? question.leadDb;
		const lead = shortFigure(leadDb, 2);
		const atReceiver = yours + leadDb;
		return {
			title: 'A loss is added back, not taken off',
			text: `The signal is stronger at ${drawn.brief.plane} than at the receiver, because the lead has already lost ${lead} dB of it. Taking ${lead} dB off once more leaves you ${shortFigure(2 * leadDb, 2)} dB low.`,
			sum: `${figure(yours, question.digits)} + ${lead} = ${figure(atReceiver, question.digits)} at the receiver, + ${lead} = ${figure(atReceiver + leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, taken off instead of added',
			bad: { at: 'answer', text: `Here: the lead’s ${lead} dB went in with the wrong sign` }
		};
	},
	make: (steps, { question }) => withLoss(steps, question.id, -2 * (lossDb ?? question.leadDb))
}));
