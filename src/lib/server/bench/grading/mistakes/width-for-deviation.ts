import { z } from 'zod';
import { defineMistake, type Context } from '../mistake';
import { toneOf } from '../modulation';
import { said } from '../said';
import { withSum } from '../spoil';

/** Carson's rule: nearly all of the power lies within 2·(deviation + tone) (J. R. Carson 1922; as it is used, from memory). */
const carsonHz = (deviationHz: number, context: Context): number =>
	2 * (deviationHz + toneOf(context).modulatingHz);

/** The width that frequency modulation takes up, by Carson's rule, given for its deviation. */
export const widthForDeviation = defineMistake('width-for-deviation', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'Carson’s width',
	phrase: 'gave the width it takes up for its deviation',
	change: (context) => carsonHz(context.question.truth, context) - context.question.truth,
	given: carsonHz,
	explain({ yours, ...context }) {
		const { question } = context;
		const { modulatingHz } = toneOf(context);
		const deviationHz = yours / 2 - modulatingHz;
		return {
			title: 'A width is not a deviation',
			text: 'Carson’s rule gives the width that the signal takes up: twice the sum of deviation and tone. The deviation is how far the frequency swings to one side.',
			sum: `2 × (${said(deviationHz, question)} + ${said(modulatingHz, question)}) = ${said(yours, question)}`,
			part: 'Carson’s width, not the deviation',
			bad: { at: 'answer', text: 'Here: the width taken up; the order asks for the deviation' }
		};
	},
	make: (steps, context) => withSum(steps, context.question.id, (value) => carsonHz(value, context))
}));
