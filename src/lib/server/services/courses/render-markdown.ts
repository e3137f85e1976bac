import createDOMPurify from 'dompurify';
import { JSDOM } from 'jsdom';
import { marked } from 'marked';

/** What prose needs and no more: nothing that fetches, runs, submits or covers the page. */
const ALLOWED = {
	ALLOWED_TAGS: [
		...[
			'p',
			'h2',
			'h3',
			'h4',
			'ul',
			'ol',
			'li',
			'strong',
			'em',
			'code',
			'pre',
			'blockquote',
			'a',
			'br',
			'hr'
		],
		...['sub', 'sup', 'table', 'thead', 'tbody', 'tr', 'th', 'td']
	],
	ALLOWED_ATTR: ['href', 'title', 'align', 'start'],
	// Links stay on this site or go to https; "//host" would be neither in plain sight.
	ALLOWED_URI_REGEXP: /^(?:https:\/\/|\/(?!\/|\\)|#)/i,
	ALLOW_DATA_ATTR: false,
	ALLOW_ARIA_ATTR: false
};

let purify: ReturnType<typeof createDOMPurify> | undefined;

/** `html` with nothing left in it but what prose needs. */
export function sanitised(html: string): string {
	purify ??= createDOMPurify(new JSDOM('').window);
	return purify.sanitize(html, ALLOWED);
}

/** Markdown to HTML that is safe to show. Run when content is imported, not when a page is asked for. */
export const renderMarkdown = (markdown: string): string =>
	sanitised(marked.parse(markdown, { async: false }));

/**
 * The same for a text with {name} and {expression | digits} in it: they come out as they went in,
 * so that Markdown's own signs in an expression keep their meaning, but escaped, so that none can smuggle in a tag.
 */
export function renderMarkdownTemplate(markdown: string): string {
	const placeholders: string[] = [];
	const marked = markdown.replace(/\{[^{}]+\}/g, (placeholder) => {
		placeholders.push(placeholder);
		return `\uE000${placeholders.length - 1}\uE001`;
	});
	return renderMarkdown(marked).replace(/\uE000(\d+)\uE001/g, (_, index: string) =>
		placeholders[Number(index)].replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')
	);
}
