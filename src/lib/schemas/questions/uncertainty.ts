/** State a value with its expanded uncertainty and coverage factor. */
import { z } from 'zod';
import { part } from '../part';
import { quantity } from '../quantity';
import { numberOrExpression, templateOf } from '../template';
import { asked } from './asked';
import { line, slug } from './words';

/**
 * How a stated ± becomes a standard uncertainty: divided by √3 (rectangular), √6 (triangular), √2 (arcsine, of mismatch), or by
 * the k that it is stated with (normal). JCGM 100:2008, 4.3 and F.2.3.3 (from memory).
 */
export const laws = ['rectangular', 'triangular', 'arcsine', 'normal'] as const;

export const uncertaintyQuestion = z.strictObject({
	type: z.literal('uncertainty'),
	...asked,
	quantity: templateOf(quantity),
	part: templateOf(part).optional(),
	unit: z.enum(['dBm', 'dBm/Hz', 'dBc', 'dB']),
	/** Of the value, dB. */
	toleranceDb: z.number().positive(),
	digits: z.int().min(0).max(3),
	/** What the value may be off by, beside the reading's own spread: each a ± in dB. */
	budget: z
		.array(
			z.strictObject({
				id: slug,
				text: line,
				db: numberOrExpression,
				law: z.enum(laws),
				/** Of `normal`: the coverage factor that the ± is stated with. */
				k: z.number().min(1).max(4).default(2)
			})
		)
		.min(1)
		.max(12),
	/** Standard deviation of a reading taken as taught, dB; what is handed in takes its own reading's. */
	spreadDb: numberOrExpression,
	/** How far the stated uncertainty may be from the budget's, as a share of it. */
	within: z.number().positive().max(0.5)
});

export type WrittenUncertainty = z.infer<typeof uncertaintyQuestion>;
