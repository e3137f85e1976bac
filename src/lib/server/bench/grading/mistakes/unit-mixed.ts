import { z } from 'zod';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { defineMistake } from '../mistake';
import { withSum } from '../spoil';
import { shownDigits } from '../spreads';

/**
 * The number of another unit given as it stands: dBm where dBc is asked, a power where a density is.
 * `gave`: that unit; `change`: its number less the one asked for, in the question's unit.
 */
export const unitMixed = defineMistake(
	'unit-mixed',
	z.strictObject({ gave: z.string().min(1).max(20), change: z.number() }),
	({ gave, change }) => ({
		stage: 'slip',
		label: `in ${gave}`,
		phrase: `gave the number in ${gave}`,
		change: () => change,
		explain({ question, yours }) {
			const { unit } = question;
			const text = (value: number) => quantityText(value, unit, shownDigits(question));
			const by = quantityText(Math.abs(change), unit.startsWith('dB') ? 'dB' : unit, shownDigits(question));
			return {
				title: `${gave} is not ${unit}`,
				text: `You gave the number that this signal has in ${gave}. The order asks for ${unit}, and here the two differ by ${by}.`,
				sum: `${text(yours)} ${change < 0 ? '+' : '−'} ${by} = ${text(yours - change)}`,
				part: `${gave} given for ${unit}`,
				bad: { at: 'answer', text: `Here: a number in ${gave}; the order asks for ${unit}` }
			};
		},
		make: (steps, { question }) => withSum(steps, question.id, (value) => value + change)
	})
);
