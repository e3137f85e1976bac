/** Choose one or several of the options offered. */
import { z } from 'zod';
import { asked } from './asked';
import { templateOf } from '../template';
import { quantity } from '../quantity';
import { condition } from './condition';
import { foreseen, line, slug, truthful, valueName } from './words';

const option = z.strictObject({
	id: slug,
	text: line,
	right: truthful,
	/** What choosing it says of the learner where it is wrong, and what leaving it out says where it is right. */
	chosen: foreseen.optional(),
	leftOut: foreseen.optional()
});

export const choiceQuestion = z.strictObject({
	type: z.literal('choice'),
	...asked,
	/** `one`: exactly one option is right on every draw. */
	pick: z.enum(['one', 'several']),
	/** Offered in this order; absent: in an order drawn from the seed. */
	inOrder: z.boolean().default(false),
	/** True values that the options' expressions may name. */
	truths: z.record(valueName, templateOf(quantity)).default({}),
	options: z.array(option).min(2).max(12),
	/** Set-ups that must have been swept before the choice can be known: each list held by one of them. */
	looked: z
		.array(z.strictObject({ conditions: z.array(condition).min(1).max(6), missing: line }))
		.max(4)
		.default([])
});

export type WrittenChoice = z.infer<typeof choiceQuestion>;
