/** Mark a place on the plot: a flag at a frequency, or a band between two. */
import { z } from 'zod';
import { part } from '../part';
import { quantity } from '../quantity';
import { numberOrExpression, templateOf } from '../template';
import { asked } from './asked';
import { tolerance } from './number';
import { foreseen, slug } from './words';

export const markQuestion = z.strictObject({
	type: z.literal('mark'),
	...asked,
	shape: z.enum(['flag', 'band']),
	/** Where it stands: the quantity's `part`, else its frequency; of a band its edges, found or stated. */
	quantity: templateOf(quantity),
	part: templateOf(part).optional(),
	/** For each place, in Hz; of a band also as a share of its width. */
	tolerance,
	/** Other places that people mark, and what marking them says. */
	mistakes: z
		.array(foreseen.extend({ id: slug, atHz: numberOrExpression, toHz: numberOrExpression.optional() }))
		.min(1)
		.max(20)
});

export type WrittenMark = z.infer<typeof markQuestion>;
