/** Fill in a table of emissions: frequency and level of each, and whether it keeps its limit. */
import { z } from 'zod';
import { numberOrExpression } from '../template';
import { asked } from './asked';
import { foreseen, line, slug, truthful, when } from './words';

const place = { id: slug, when: when.optional(), atHz: numberOrExpression };

export const emissionsQuestion = z.strictObject({
	type: z.literal('emissions'),
	...asked,
	/** Every row that is asked for: its level is the scene's own there unless it is given. */
	emissions: z
		.array(
			z.strictObject({
				...place,
				/** "the second harmonic" */
				name: line,
				levelDbm: numberOrExpression.optional(),
				/** Whether it breaks its limit; asked of each row or of none. */
				breaks: truthful.optional()
			})
		)
		.min(1)
		.max(12),
	toleranceHz: z.number().positive(),
	toleranceDb: z.number().positive(),
	/** What stands on the screen and is none of them: products and residuals of the receiver's own, images. */
	ghosts: z.array(foreseen.extend(place)).max(12).default([])
});

export type WrittenEmissions = z.infer<typeof emissionsQuestion>;
