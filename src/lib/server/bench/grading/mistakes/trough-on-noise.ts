import { z } from 'zod';
import { powerRatioToDb } from '$lib/units/decibel';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type SetUp } from '../mistake';
import { shownPower } from '../noise-law';
import { heldLonger, withSettings } from '../spoil';

const WORDS = {
	detector: {
		label: 'minimum detector',
		phrase: 'let the detector pick troughs',
		title: 'A minimum detector reads noise low',
		cause: 'the lowest level met in its bucket',
		bad: 'Here: detector minimum; take average'
	},
	hold: {
		label: 'held minimum',
		phrase: 'read a held minimum',
		title: 'A held minimum is not a power',
		cause: 'the lowest of all its sweeps',
		bad: 'Here: the trace holds its minimum; take average'
	}
};

const picksTroughs = ({ trace, resolved }: SetUp, by: keyof typeof WORDS): boolean =>
	by === 'hold' ? trace.mode === 'min-hold' : resolved.detector === 'negative-peak';

/** A signal that looks like noise read through a minimum detector, or off a held minimum: the power of its troughs. */
export const troughOnNoise = defineMistake(
	'trough-on-noise',
	z.strictObject({ by: z.enum(['detector', 'hold']) }),
	({ by }) => ({
		stage: 'reading',
		label: WORDS[by].label,
		phrase: WORDS[by].phrase,
		families: ['band', 'density'],
		shows: ({ setUp }) => picksTroughs(setUp, by),
		predict: ({ question }, setUp) =>
			picksTroughs(setUp, by)
				? { value: question.truth + powerRatioToDb(shownPower(setUp)), spread: by === 'hold' ? 0.4 : 0.25 }
				: null,
		explain({ setUp, change, yours, question }) {
			const lowDb = setUp ? -powerRatioToDb(shownPower(setUp)) : change;
			return {
				title: WORDS[by].title,
				text: `A signal of this kind rises and falls like noise. Each point of your trace is ${WORDS[by].cause}, so the power added up is that of the troughs. A minimum is for what stands still.`,
				sum: `${figure(yours, question.digits)} + ${figure(lowDb, 1)} = ${figure(yours + lowDb, question.digits)} ${question.unit}`,
				note:
					Math.abs(lowDb - change) < 0.05
						? undefined
						: `troughs stand ${figure(lowDb, 1)} dB under the mean; with the receiver’s own error, ${figure(change, 1)} dB`,
				part: by === 'hold' ? 'troughs kept by the hold' : 'troughs picked by the detector',
				bad: { at: 'set-up', text: WORDS[by].bad }
			};
		},
		make: (steps) =>
			by === 'hold'
				? heldLonger(steps, 'min-hold', 'sample')
				: withSettings(steps, { detector: 'negative-peak' })
	})
);
