/** What was found in lessons, exercises and glossary. */
import { z } from 'zod';

/** The longest query that is looked for, in characters. */
export const longestQuery = 100;

/** A stretch of text, and whether it is what was looked for. */
export const foundText = z.array(z.strictObject({ text: z.string(), hit: z.boolean() }));

export const findView = z.strictObject({
	query: z.string(),
	/** How many were found; the best of them are shown. */
	total: z.int(),
	results: z.array(
		z.strictObject({
			kind: z.enum(['lesson', 'exercise', 'term']),
			title: foundText,
			/** "Unit 4, The floor" */
			place: z.string(),
			href: z.string(),
			/** The text around the first hit; empty where the title says it all. */
			excerpt: foundText
		})
	)
});

export type FoundText = z.infer<typeof foundText>;
export type FindView = z.infer<typeof findView>;
