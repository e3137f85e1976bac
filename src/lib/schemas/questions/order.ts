/** Put items in order. */
import { z } from 'zod';
import { quantity } from '../quantity';
import { numberOrExpression, templateOf } from '../template';
import { asked } from './asked';
import { foreseen, line, slug, valueName } from './words';

export const orderQuestion = z.strictObject({
	type: z.literal('order'),
	...asked,
	/** True values that the items' expressions may name. */
	truths: z.record(valueName, templateOf(quantity)).default({}),
	/** By what they are ordered, as numbers of one kind. */
	items: z
		.array(z.strictObject({ id: slug, text: line, by: numberOrExpression }))
		.min(2)
		.max(8),
	first: z.enum(['least', 'greatest']),
	/** How far apart two neighbours are at least, on every draw. */
	apart: z.number().positive(),
	/** What it says of the learner when the first of two is put after the second, where it belongs before. */
	mistakes: z
		.array(foreseen.extend({ id: slug, items: z.tuple([slug, slug]) }))
		.max(12)
		.default([])
});

export type WrittenOrder = z.infer<typeof orderQuestion>;
