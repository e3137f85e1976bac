import { z } from 'zod';
import { defineMistake } from '../mistake';
import { ownError } from '../own-error';
import { said } from '../said';
import { withSum } from '../spoil';

/** The number that should be, off a plate or a list, given for the number that is. */
export const notMeasured = defineMistake(
	'not-measured',
	z.strictObject({ valueHz: z.number() }),
	({ valueHz }) => ({
		stage: 'slip',
		label: 'what it should be',
		phrase: 'gave what it should be, not what it is',
		// what is reported has none of the receiver's error in it
		change: (context) => valueHz - context.question.truth - ownError(context),
		explain: ({ question }) => ({
			title: 'What it should be is not what it is',
			text: `${said(valueHz, question)} stands in your order: it is where the carrier belongs. You were sent to find out where it is.`,
			sum: `${said(question.truth, question)} − ${said(valueHz, question)} = ${said(question.truth - valueHz, question)}`,
			part: 'from where it belongs to where it is',
			bad: { at: 'answer', text: 'Here: the number from the order, not from the bench' }
		}),
		make: (steps, { question }) => withSum(steps, question.id, () => valueHz)
	})
);
