import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { correctsOnBench, withSettings, withSum } from '../spoil';

/** What Correction said. */
function correctionWords(appliedDb: number, leadDb: number): string {
	if (appliedDb === 0) return 'Correction was still at 0 dB';
	if (Math.abs(appliedDb - leadDb) < 0.005) return 'what Correction had put back was taken off again';
	return `Correction was ${shortFigure(appliedDb, 2)} dB`;
}

/** The lead's loss not added back: the level at the receiver reported as that at the reference plane. */
export const leadLeftOut = defineMistake('lead-left-out', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'lead left out',
	phrase: 'left the lead out',
	change: ({ question }) => -question.leadDb,
	explain({ question, drawn, source, yours }) {
		const lead = shortFigure(question.leadDb, 2);
		const set = source ? correctionWords(source.appliedDb, question.leadDb) : 'it was not added back';
		return {
			title: 'The lead stands between you and the answer',
			text: `Your order asks for the level at ${drawn.brief.plane}. The lead loses ${lead} dB on the way to the receiver, and ${set}.`,
			sum: `${figure(yours, question.digits)} + ${lead} = ${figure(yours + question.leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, not added back',
			bad: { at: 'answer', text: `Here: the answer is without the lead’s ${lead} dB` }
		};
	},
	make: (steps, { question }) =>
		correctsOnBench(steps)
			? withSettings(steps, { correctionDb: 0 })
			: withSum(steps, question.id, (value) => value - question.leadDb)
}));
