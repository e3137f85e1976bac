/** content/<course>/glossary.yaml: the terms of a course in plain words. */
import { z } from 'zod';

const name = z.string().trim().min(1).max(60);

export const glossaryEntry = z.strictObject({
	term: name,
	/** Other forms of it that lessons use: the plural, a short form. One with a capital is matched as written. */
	forms: z.array(name).max(12).default([]),
	/** One sentence or two. */
	definition: z.string().trim().min(10).max(320),
	/** Slug of the unit that teaches it. */
	unit: z.string().min(1).max(80),
	/** Where a fact in the definition is from. */
	source: z.string().trim().min(1).max(200).optional()
});
export const glossaryFile = z.array(glossaryEntry).max(400);

export type GlossaryEntry = z.infer<typeof glossaryEntry>;
/** A term with its name in addresses. */
export type GlossaryTerm = GlossaryEntry & { slug: string };

/** "Adjacent-channel power" → "adjacent-channel-power": small letters, digits and single hyphens. */
export const termSlug = (term: string): string =>
	term
		.toLowerCase()
		.normalize('NFKD')
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-|-$/g, '');

/** A term as a lesson shows it beside the word. */
export const termNote = z.strictObject({ slug: z.string(), term: z.string(), definition: z.string() });

export const glossaryView = z.strictObject({
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	terms: z.array(
		z.strictObject({
			...termNote.shape,
			forms: z.array(z.string()),
			source: z.string().nullable(),
			unit: z.strictObject({ number: z.int(), slug: z.string(), title: z.string() })
		})
	)
});

export type TermNote = z.infer<typeof termNote>;
export type GlossaryView = z.infer<typeof glossaryView>;
