import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { defineMistake, type Context } from '../mistake';
import { withSum } from '../spoil';
import { shownDigits } from '../spreads';

/**
 * One thing given for another that is twice or half as much: peak to peak for peak, one side for both.
 * `factor`: given over asked, of a power where the answer is in decibels. `gave`, `wanted`: the two in words, "the peak-to-peak deviation".
 */
export const halfOrDouble = defineMistake(
	'half-or-double',
	z.strictObject({
		factor: z.union([z.literal(0.5), z.literal(2)]),
		gave: z.string().min(1).max(80),
		wanted: z.string().min(1).max(80)
	}),
	({ factor, gave, wanted }) => {
		const inDecibels = ({ question }: Context) => question.unit.startsWith('dB');
		const given = (value: number, context: Context) =>
			inDecibels(context) ? value + powerRatioToDb(factor) : value * factor;
		return {
			stage: 'slip',
			label: factor === 2 ? 'doubled' : 'halved',
			phrase: `gave ${gave} for ${wanted}`,
			change: (context) => given(context.question.truth, context) - context.question.truth,
			given,
			explain({ yours, ...context }) {
				const { question } = context;
				const text = (value: number) => quantityText(value, question.unit, shownDigits(question));
				const right = inDecibels(context) ? yours - powerRatioToDb(factor) : yours / factor;
				return {
					title: factor === 2 ? 'Twice what was asked' : 'Half of what was asked',
					text: `You gave ${gave}. The order asks for ${wanted}, and that is ${factor === 2 ? 'half' : 'twice'} as much.`,
					sum: `${text(yours)} ${factor === 2 ? '÷' : '×'} 2 = ${text(right)}`,
					part: `${gave}, not ${wanted}`,
					bad: { at: 'answer', text: `Here: ${gave}; the order asks for ${wanted}` }
				};
			},
			make: (steps, context) => withSum(steps, context.question.id, (value) => given(value, context))
		};
	}
);
