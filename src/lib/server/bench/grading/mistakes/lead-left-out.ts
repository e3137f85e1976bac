import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { leadLoss } from '../lead-loss';
import { defineMistake } from '../mistake';
import { withLoss } from '../spoil';

/** What Correction said. */
function correctionWords(appliedDb: number, leadDb: number): string {
	if (appliedDb === 0) return 'Correction was still at 0 dB';
	if (Math.abs(appliedDb - leadDb) < 0.005) return 'what Correction had put back was taken off again';
	return `Correction was ${shortFigure(appliedDb, 2)} dB`;
}

/**
 * The lead's loss not added back: the level at the receiver reported as that at the reference plane.
 * `lossDb`: the lead's own, where more than the lead stands between; absent: all that does.
 */
export const leadLeftOut = defineMistake('lead-left-out', leadLoss, ({ lossDb }) => ({
	stage: 'slip',
	label: 'lead left out',
	phrase: 'left the lead out',
	change: ({ question }) => -(lossDb ?? question.leadDb),
	explain({ question, drawn, source, yours }) {
		const leadDb = lossDb ?? question.leadDb;
		const lead = shortFigure(leadDb, 2);
		const set = source ? correctionWords(source.appliedDb, leadDb) : 'it was not added back';
		return {
			title: 'The lead stands between you and the answer',
			text: `Your order asks for the level at ${drawn.brief.plane}. The lead loses ${lead} dB on the way to the receiver, and ${set}. A loss is made good with a plus: Correction +${lead} dB.`,
			sum: `${figure(yours, question.digits)} + ${lead} = ${figure(yours + leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, not added back',
			bad: { at: 'answer', text: `Here: the answer is without the lead’s ${lead} dB` }
		};
	},
	make: (steps, { question }) => withLoss(steps, question.id, -(lossDb ?? question.leadDb))
}));
