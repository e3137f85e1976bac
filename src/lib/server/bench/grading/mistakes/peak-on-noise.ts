import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type SetUp } from '../mistake';
import { shownPower } from '../noise-law';
import { heldLonger, withSettings } from '../spoil';

const WORDS = {
	detector: {
		label: 'peak detector',
		phrase: 'let the detector pick peaks',
		title: 'A peak detector reads noise high',
		bad: 'Here: detector positive peak; take average'
	},
	hold: {
		label: 'held maximum',
		phrase: 'read a held maximum',
		title: 'A held maximum is not a power',
		bad: 'Here: the trace holds its maximum; take average'
	}
};

const picksCrests = ({ trace, resolved }: SetUp, by: keyof typeof WORDS): boolean =>
	by === 'hold' ? trace.mode === 'max-hold' : resolved.detector === 'positive-peak';

/** A signal that looks like noise read through a positive-peak detector, or off a held maximum: the power of its crests. */
export const peakOnNoise = defineMistake(
	'peak-on-noise',
	z.strictObject({ by: z.enum(['detector', 'hold']) }),
	({ by }) => ({
		stage: 'reading',
		label: WORDS[by].label,
		phrase: WORDS[by].phrase,
		families: ['band', 'density'],
		shows: ({ setUp }) => picksCrests(setUp, by),
		predict: ({ question }, setUp) =>
			picksCrests(setUp, by)
				? {
						value: question.truth + powerRatioToDb(shownPower(setUp)),
						spread: by === 'hold' ? 0.35 : 0.2
					}
				: null,
		explain({ setUp, change, yours, question }) {
			const rows = setUp?.sweeps ?? 1;
			const shownDb = setUp ? powerRatioToDb(shownPower(setUp)) : Math.abs(change);
			const cause =
				by === 'hold'
					? `Each point of your trace is the highest of ${rows} sweeps`
					: 'Each point of your trace is the highest level met in its bucket';
			return {
				title: WORDS[by].title,
				text: `A signal of this kind rises and falls like noise. ${cause}, so the power added up is that of the crests, not the mean.`,
				sum: `${figure(yours, question.digits)} − ${figure(shownDb, 1)} = ${figure(yours - shownDb, question.digits)} ${question.unit}`,
				note:
					Math.abs(shownDb + change) < 0.05
						? undefined
						: `crests stand ${figure(shownDb, 1)} dB over the mean; with the receiver’s own error, ${figure(Math.abs(change), 1)} dB`,
				part: by === 'hold' ? 'crests kept by the hold' : 'crests picked by the detector',
				bad: { at: 'set-up', text: WORDS[by].bad }
			};
		},
		make: (steps) =>
			by === 'hold'
				? heldLonger(steps, 'max-hold', 'auto')
				: withSettings(steps, { detector: 'positive-peak' })
	})
);
