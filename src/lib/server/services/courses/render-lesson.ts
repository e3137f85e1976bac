import { marked, type Token, type Tokens, type TokensList } from 'marked';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import type { Lesson, LessonPart } from '$lib/schemas/lesson';
import { isFigureBlock } from '$lib/server/content/read-lesson';
import { markTerms } from './mark-terms';
import { sanitised } from './render-markdown';
import { textOf } from './text-of';

/**
 * A lesson to show, made when content is imported.
 * @param markdown whose first heading of the first level is the lesson's title
 * @param figureIds of its figure blocks, in their order
 * @param unitTitle the title of a lesson that has none of its own
 * @param glossary whose terms are marked where the lesson first uses them
 */
export function renderLesson(
	markdown: string,
	figureIds: readonly string[],
	unitTitle: string,
	glossary: readonly GlossaryTerm[] = []
): Lesson {
	const tokens = marked.lexer(markdown);
	const heading = tokens.find(
		(token): token is Tokens.Heading => token.type === 'heading' && token.depth === 1
	);
	const parts: LessonPart[] = [];
	let prose: Token[] = [];
	const close = () => {
		const html = sanitised(marked.parser(Object.assign(prose, { links: tokens.links }) as TokensList)).trim();
		if (html) parts.push({ kind: 'text', html });
		prose = [];
	};
	let figures = 0;
	for (const token of tokens) {
		if (isFigureBlock(token)) {
			close();
			parts.push({ kind: 'figure', id: figureIds[figures++] });
		} else if (token !== heading) prose.push(token);
	}
	close();
	const title = heading ? textOf(marked.parseInline(heading.text, { async: false }), '') : unitTitle;
	return { title, words: wordsIn(parts), parts: nameHeadings(markTerms(parts, glossary)) };
}

const wordsIn = (parts: readonly LessonPart[]): number =>
	parts
		.map((part) => (part.kind === 'text' ? textOf(part.html, ' ') : ''))
		.join(' ')
		.split(/\s+/)
		.filter((word) => /[\p{L}\p{N}]/u.test(word)).length;

/** Gives each heading of a lesson a name of its own, part-1, part-2 …, so that an address can lead to it. */
function nameHeadings(parts: readonly LessonPart[]): LessonPart[] {
	let headings = 0;
	return parts.map((part) =>
		part.kind === 'text'
			? { ...part, html: part.html.replaceAll('<h2>', () => `<h2 id="part-${(headings += 1)}">`) }
			: part
	);
}
