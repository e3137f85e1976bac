import { marked, type Token, type Tokens, type TokensList } from 'marked';
import type { Lesson, LessonPart } from '$lib/schemas/lesson';
import { isFigureBlock } from '$lib/server/content/read-lesson';
import { sanitised } from './render-markdown';

/**
 * A lesson to show, made when content is imported.
 * @param markdown whose first heading of the first level is the lesson's title
 * @param figureIds of its figure blocks, in their order
 * @param unitTitle the title of a lesson that has none of its own
 */
export function renderLesson(markdown: string, figureIds: readonly string[], unitTitle: string): Lesson {
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
	return { title, words: wordsIn(parts), parts };
}

const ENTITIES: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', '#39': '’' };
/** @param gap what stands where a tag stood: blocks of text part words, what is set in italics doesn't */
const textOf = (html: string, gap: string): string =>
	html.replace(/<[^>]*>/g, gap).replace(/&(amp|lt|gt|quot|#39);/g, (_, name: string) => ENTITIES[name]);

const wordsIn = (parts: readonly LessonPart[]): number =>
	parts
		.map((part) => (part.kind === 'text' ? textOf(part.html, ' ') : ''))
		.join(' ')
		.split(/\s+/)
		.filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
