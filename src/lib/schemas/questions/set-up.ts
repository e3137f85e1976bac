/** Set the receiver up so that stated conditions hold. */
import { z } from 'zod';
import { asked } from './asked';
import { settings } from '../settings';
import { templateOf } from '../template';
import { condition } from './condition';
import { line, slug } from './words';

export const setUpQuestion = z.strictObject({
	type: z.literal('set-up'),
	...asked,
	conditions: z.array(condition).min(1).max(12),
	/** Ways to miss it: settings typed over the taught ones, and the conditions that they break. */
	mistakes: z
		.array(z.strictObject({ id: slug, settings: templateOf(settings), breaks: z.array(line).min(1).max(12) }))
		.min(1)
		.max(20)
});

export type WrittenSetUp = z.infer<typeof setUpQuestion>;
