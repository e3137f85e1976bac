import { z } from 'zod';
import { figure, shortFigure } from '../../exercise/figure';
import { defineMistake } from '../mistake';
import { correctsOnBench, withSettings, withSum } from '../spoil';

/** The lead's loss not added back: the level at the receiver reported as that at the reference plane. */
export const leadLeftOut = defineMistake('lead-left-out', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'lead left out',
	phrase: 'left the lead out',
	change: ({ question }) => -question.leadDb,
	explain({ question, drawn, source, yours }) {
		const lead = shortFigure(question.leadDb, 2);
		const set = source
			? `Correction was ${source.appliedDb === 0 ? 'still at 0' : shortFigure(source.appliedDb, 2)} dB`
			: 'it was not added back';
		return {
			title: 'The lead stands between you and the answer',
			text: `Your order asks for the level at ${drawn.brief.plane}. The lead loses ${lead} dB on the way to the receiver, and ${set}.`,
			sum: `${figure(yours, question.digits)} + ${lead} = ${figure(yours + question.leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, not added back',
			bad: {
				at: 'answer',
				text: `Here: Correction ${source ? shortFigure(source.appliedDb, 2) : '0'} dB, the lead is ${lead} dB`
			}
		};
	},
	make: (steps, { question }) =>
		correctsOnBench(steps)
			? withSettings(steps, { correctionDb: 0 })
			: withSum(steps, question.id, (value) => value - question.leadDb)
}));
