import { describe, expect, it } from 'vitest';
import type { GlossaryTerm } from '$lib/schemas/glossary';
import { markTerms, termsIn } from '$lib/server/services/courses/mark-terms';

const term = (name: string, ...forms: string[]): GlossaryTerm => ({
	...{ term: name, forms, slug: name.toLowerCase().replaceAll(' ', '-') },
	...{ definition: 'What it is, in words.', unit: 'u' }
});
const glossary = [
	term('Marker', 'markers'),
	term('Channel power'),
	term('dBm'),
	term('DC block'),
	term('Pad', 'pads')
];
const marked = (...html: string[]) => {
	const parts = markTerms(
		html.map((text) => ({ kind: 'text' as const, html: text })),
		glossary
	);
	return { html: parts.map((part) => (part.kind === 'text' ? part.html : '')), terms: termsIn(parts) };
};

describe('markTerms(parts, glossary)', () => {
	it('marks the first use of a term in a lesson, whatever its form, and no later one', () => {
		const { html, terms } = marked('<p>Two markers, then a marker.</p>', '<p>A marker again.</p>');
		expect(html[0]).toBe(
			'<p>Two <a class="term" href="/learn/glossary#marker" data-term="marker" aria-describedby="term-marker">markers</a>, then a marker.</p>'
		);
		expect(html[1]).toBe('<p>A marker again.</p>');
		expect(terms).toEqual(['marker']);
	});

	it('marks several terms of one sentence, in their order', () => {
		expect(marked('<p>Channel power in dBm behind a pad.</p>').terms).toEqual([
			'channel-power',
			'dbm',
			'pad'
		]);
	});

	it('takes the longest term, across a line’s end too, and none within a word', () => {
		expect(marked('<p>channel\npower</p>').terms).toEqual(['channel-power']);
		expect(marked('<p>Padding, a pad-and-lead, an ipad.</p>').terms).toEqual([]);
	});

	it('knows an abbreviation only as it is written', () => {
		expect(marked('<p>DBM and dc block</p>').terms).toEqual([]);
		expect(marked('<p>A DC block for −20 dBm</p>').terms).toEqual(['dc-block', 'dbm']);
	});

	it('leaves links, headings, formulas and code as they are', () => {
		const html =
			'<h2>Marker</h2><p><a href="/x">pads</a> <code>dBm</code></p><blockquote>channel power</blockquote>';
		expect(marked(html)).toEqual({ html: [html], terms: [] });
	});

	it('lets nothing be made of what stood in the text', () => {
		expect(marked('<p>1 &lt; 2 &amp; a marker</p>').html[0]).toContain('<p>1 &lt; 2 &amp; a <a class="term"');
	});
});
