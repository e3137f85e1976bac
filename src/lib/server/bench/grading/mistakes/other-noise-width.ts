import { formatFrequency } from '$lib/units/format-quantity';
import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { sameWidth } from '../read-width';
import { modelSpread } from '../spreads';
import { readStepOf, withReading } from '../spoil';

/** A ratio of carrier to noise over another width than the order's. */
export const otherNoiseWidth = defineMistake(
	'other-noise-width',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: `in ${formatFrequency(widthHz)}`,
		phrase: `counted the noise in ${formatFrequency(widthHz)}`,
		families: ['carrier-to-noise'],
		shows: ({ request }, { question: { quantity } }) =>
			request.kind === 'carrier-to-noise' &&
			quantity.kind === 'carrier-to-noise' &&
			!sameWidth(request.widthHz, quantity.widthHz),
		predict({ question }) {
			const { quantity, truth } = question;
			if (quantity.kind !== 'carrier-to-noise') return null;
			return {
				value: truth + powerRatioToDb(quantity.widthHz / widthHz),
				spread: 3 * modelSpread(question)
			};
		},
		explain({ source, yours, question }) {
			const { quantity, digits, unit } = question;
			const wanted = quantity.kind === 'carrier-to-noise' ? quantity.widthHz : widthHz;
			const read = source?.request.kind === 'carrier-to-noise' ? source.request.widthHz : widthHz;
			const db = powerRatioToDb(read / wanted);
			return {
				title: 'Noise grows with its width',
				text: `You counted the noise in ${formatFrequency(read)}; the order says ${formatFrequency(wanted)}. The carrier is the same in both, the noise is not.`,
				sum: `${figure(yours, digits)} ${db < 0 ? '−' : '+'} ${figure(Math.abs(db), 1)} = ${figure(yours + db, digits)} ${unit}`,
				part: `noise in ${formatFrequency(read)}, not in ${formatFrequency(wanted)}`,
				bad: {
					at: 'reading',
					text: `Here: ${formatFrequency(read)}; the order says ${formatFrequency(wanted)}`
				}
			};
		},
		make(steps, { question }) {
			const { reading } = readStepOf(steps, question.id);
			return withReading(steps, question.id, { ...reading, widthHz } as typeof reading);
		}
	})
);
