import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { averagesDecibels, LOG_AVERAGE_DB } from '../noise-law';
import { withSettings } from '../spoil';
import { modelSpread } from '../spreads';

/** Powers added up from a trace averaged in decibels: 2.51 dB low on anything that behaves as noise. */
export const logAverage = defineMistake('log-average', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'averaged in dB',
	phrase: 'averaged decibels',
	families: ['band'],
	shows: (source) => averagesDecibels(source.setUp),
	predict: ({ question }, setUp) =>
		averagesDecibels(setUp)
			? { value: question.truth - LOG_AVERAGE_DB, spread: modelSpread(question) }
			: null,
	explain: ({ change, yours, question }) => ({
		title: 'The mean of decibels is not the mean power',
		text: 'Your trace averaged decibels. Noise falls far below its mean more often than it rises far above, so the mean of its levels stands 2.51 dB under the level of its mean. Averages on power add up right.',
		sum: `${figure(yours, question.digits)} + 2.51 = ${figure(yours + LOG_AVERAGE_DB, question.digits)} ${question.unit}`,
		note:
			Math.abs(change - LOG_AVERAGE_DB) < 0.05
				? undefined
				: `with noise and the receiver’s own error, ${figure(change, 1)} dB`,
		part: 'lost to averaging decibels',
		bad: { at: 'set-up', text: 'Here: averages on decibels; set Averages to power' }
	}),
	make: (steps) => withSettings(steps, { scale: 'log' })
}));
