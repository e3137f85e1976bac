import { marked } from 'marked';
import type { LessonPreview } from '$lib/schemas/preview-view';

/** What a lesson can lead to, by slug. */
export interface Destinations {
	units: ReadonlySet<string>;
	exercises: ReadonlySet<string>;
}

/** The links of a lesson's text, each with what is wrong with it. Pages elsewhere are not asked for. */
export function linksIn(markdown: string, known: Destinations): LessonPreview['links'] {
	const found = new Set<string>();
	marked.walkTokens(marked.lexer(markdown), (token) => {
		if (token.type === 'link') found.add(String((token as { href: string }).href));
	});
	return [...found].map((href) => ({ href, problem: problemOf(href, known) }));
}

function problemOf(href: string, { units, exercises }: Destinations): string | null {
	if (href.startsWith('https://')) return URL.canParse(href) ? null : 'is no address';
	const [path] = href.split(/[?#]/);
	if (href.startsWith('#')) return null;
	const [, kind, slug] = /^\/learn\/(units|exercises)\/([a-z0-9-]+)$/.exec(path) ?? [];
	if (kind === 'units') return units.has(slug) ? null : 'there is no such unit';
	if (kind === 'exercises') return exercises.has(slug) ? null : 'there is no such exercise';
	return path === '/learn' ? null : 'leads nowhere: use https://…, /learn/units/… or /learn/exercises/…';
}
