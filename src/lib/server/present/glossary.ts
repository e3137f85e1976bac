import type { GlossaryTerm, GlossaryView, TermNote } from '$lib/schemas/glossary';

/** A term as a lesson shows it beside the word. */
export const presentTerm = ({ slug, term, definition }: GlossaryTerm): TermNote => ({
	slug,
	term,
	definition
});

/** A term as the glossary lists it. */
export const presentGlossaryTerm = (
	term: GlossaryTerm,
	unit: { number: number; slug: string; title: string }
): GlossaryView['terms'][number] => ({
	...presentTerm(term),
	forms: term.forms,
	source: term.source ?? null,
	unit: { number: unit.number, slug: unit.slug, title: unit.title }
});
