import { JSDOM } from 'jsdom';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import type { LessonPart } from '$lib/schemas/lesson';

/** To take HTML apart in; nothing of it is kept. */
let page: JSDOM['window'] | undefined;
/** Where a word is no word of the text: links, formulas, headings. */
const APART = 'a, code, pre, blockquote, h2, h3, h4, th';

/**
 * The parts of a lesson with each term of the glossary marked where it is first used: a link to the glossary, which is all there is
 * without script, named by `data-term` and described by the definition, which stands on the page under `term-<slug>`.
 * @param parts whose HTML has been sanitised
 */
export function markTerms(parts: readonly LessonPart[], glossary: readonly GlossaryTerm[]): LessonPart[] {
	const names = glossary
		.flatMap(({ slug, term, forms }) => [term, ...forms].map((name) => ({ name, slug })))
		.sort((a, b) => b.name.length - a.name.length);
	if (names.length === 0) return [...parts];
	// Not within a word, nor beside a hyphen: "pad" is in no "padding" and no "pad-and-lead".
	const anyName = new RegExp(
		`(?<![\\p{L}\\p{N}-])(?:${names.map(({ name }) => escaped(name)).join('|')})(?![\\p{L}\\p{N}-])`,
		'giu'
	);
	const { document } = (page ??= new JSDOM('').window);
	const used = new Set<string>();
	const termOf = (text: string) =>
		names.find(({ name }) =>
			// An abbreviation means something only as it is written; a term of the glossary may open a sentence or not.
			isAbbreviation(name) ? name === text : name.toLowerCase() === text.toLowerCase()
		)?.slug;
	return parts.map((part) => {
		if (part.kind !== 'text') return part;
		const body = document.createElement('div');
		body.innerHTML = part.html;
		for (const node of textsIn(body)) markIn(node, anyName, termOf, used);
		return { kind: 'text', html: body.innerHTML };
	});
}

/** A capital anywhere but at the beginning. */
const isAbbreviation = (name: string): boolean => /\p{Lu}/u.test(name.slice(1));
const escaped = (name: string): string => name.replace(/[.*+?^${}()|[\]\\]/g, '\\$&').replace(/ /g, '\\s+');

function textsIn(body: HTMLElement): Text[] {
	const walker = body.ownerDocument.createTreeWalker(body, 4 /* SHOW_TEXT */);
	const texts: Text[] = [];
	while (walker.nextNode()) {
		const node = walker.currentNode as Text;
		if (!node.parentElement?.closest(APART)) texts.push(node);
	}
	return texts;
}

function markIn(
	node: Text,
	anyName: RegExp,
	termOf: (text: string) => string | undefined,
	used: Set<string>
): void {
	const document = node.ownerDocument;
	const text = node.data;
	let rest = node;
	/** How much of the text stands before `rest`. */
	let before = 0;
	for (const match of text.matchAll(anyName)) {
		const slug = termOf(match[0].replace(/\s+/g, ' '));
		if (!slug || used.has(slug)) continue;
		used.add(slug);
		const word = rest.splitText(match.index - before);
		rest = word.splitText(match[0].length);
		before = match.index + match[0].length;
		const link = document.createElement('a');
		link.className = 'term';
		link.href = `/learn/glossary#${slug}`;
		link.setAttribute('data-term', slug);
		link.setAttribute('aria-describedby', `term-${slug}`);
		word.replaceWith(link);
		link.append(word);
	}
}

/** Slugs of the terms that are marked in a lesson, in the order of their first use. */
export const termsIn = (parts: readonly LessonPart[]): string[] =>
	parts.flatMap((part) =>
		part.kind === 'text' ? [...part.html.matchAll(/ data-term="([a-z0-9-]+)"/g)].map(([, slug]) => slug) : []
	);
