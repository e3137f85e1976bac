import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { correctsOnBench, withSettings, withSum } from '../spoil';

/** The lead counted twice: set as Correction on the bench, then added to the reading once more by hand. */
export const leadTwice = defineMistake('lead-twice', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'lead added twice',
	phrase: 'added the lead twice',
	change: ({ question }) => question.leadDb,
	explain({ question, yours }) {
		const lead = shortFigure(question.leadDb, 2);
		return {
			title: 'The reading had the lead in it already',
			text: `With Correction at ${lead} dB every level on the bench already stands at the reference plane. Adding ${lead} dB by hand counts the lead twice.`,
			sum: `${figure(yours, question.digits)} − ${lead} = ${figure(yours - question.leadDb, question.digits)} ${question.unit}`,
			part: 'the lead, added a second time',
			bad: { at: 'answer', text: `Here: the lead’s ${lead} dB was in the reading already` }
		};
	},
	make(steps, { question }) {
		const corrected = correctsOnBench(steps) ? steps : withSettings(steps, { correctionDb: question.leadDb });
		return withSum(corrected, question.id, (value) => value + question.leadDb);
	}
}));
