import { describe, expect, it } from 'vitest';
import { renderMarkdown, renderMarkdownTemplate } from '$lib/server/services/courses/render-markdown';

describe('renderMarkdown(markdown)', () => {
	it('keeps prose: headings, lists, tables, links of this site and over https', () => {
		const html = renderMarkdown(
			'## Why\n\n- a **b**\n\n[here](/learn) [there](https://example.org)\n\n|a|b|\n|-|-|\n|1|2|'
		);
		for (const part of [
			'<h2>Why</h2>',
			'<strong>b</strong>',
			'href="/learn"',
			'href="https://example.org"',
			'<td>1</td>'
		]) {
			expect(html).toContain(part);
		}
	});

	it.each([
		'<script>alert(1)</script>',
		'<img src=x onerror=alert(1)>',
		'<form action="https://evil.example"><input type=password></form>',
		'<p style="position:fixed">x</p>',
		'<svg><script>alert(1)</script></svg>',
		'<math><mtext></mtext></math>',
		'<iframe src="https://evil.example"></iframe>',
		'<a href="javascript:alert(1)">x</a>',
		'[x](javascript:alert(1))',
		'[x](//evil.example)',
		'[x](/\\evil.example)',
		'[x](data:text/html,hi)',
		'![x](https://evil.example/x.png)',
		'<a href="/x" onclick="alert(1)" data-x="1" target="_blank">x</a>',
		'<noscript><p title="</noscript><img src=x onerror=alert(1)>"></noscript>'
	])('lets nothing through that runs, fetches, submits or covers the page: %s', (vector) => {
		expect(renderMarkdown(vector)).not.toMatch(
			/<(script|img|form|input|svg|math|iframe|noscript|style)|\son\w+=|style=|javascript:|data:|data-|href="\/[/\\]|target=/i
		);
	});
});

describe('renderMarkdownTemplate(markdown)', () => {
	it('leaves placeholders as written, whatever Markdown would make of their signs', () =>
		expect(renderMarkdownTemplate('A *lead* of {2*lossDb*3 | 1} dB and {x_1_2}.').trim()).toBe(
			'<p>A <em>lead</em> of {2*lossDb*3 | 1} dB and {x_1_2}.</p>'
		));

	it('escapes what a placeholder could smuggle in', () =>
		expect(renderMarkdownTemplate('{<img src=x onerror=alert(1)>}')).not.toContain('<img'));
});
