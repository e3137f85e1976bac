import { describe, expect, it } from 'vitest';
import { renderLesson } from '$lib/server/services/courses/render-lesson';

const block = '```figure\nid: hump\n```';

describe('renderLesson(markdown, figureIds, unitTitle)', () => {
	it('puts figures between pieces of prose, in the order written', () => {
		const { parts } = renderLesson(`# Why\n\nOne.\n\n${block}\n\nTwo.\n\n${block}\n`, ['a', 'b'], 'Unit');
		expect(parts).toEqual([
			{ kind: 'text', html: '<p>One.</p>' },
			{ kind: 'figure', id: 'a' },
			{ kind: 'text', html: '<p>Two.</p>' },
			{ kind: 'figure', id: 'b' }
		]);
	});

	it('takes the title from the heading and leaves it out of the prose', () => {
		const lesson = renderLesson('# Why a *marker* misleads & more\n\nOne.', [], 'Unit');
		expect(lesson.title).toBe('Why a marker misleads & more');
		expect(lesson.parts).toEqual([{ kind: 'text', html: '<p>One.</p>' }]);
		expect(renderLesson('One.', [], 'Unit').title).toBe('Unit');
	});

	it('counts the words of the prose, neither tags nor figures', () =>
		expect(renderLesson(`# No\n\nFour _words_ are here − 5.\n\n${block}\n`, ['a'], 'Unit').words).toBe(5));

	it('follows links that are defined behind a figure', () =>
		expect(renderLesson(`[x][y]\n\n${block}\n\n[y]: /learn`, ['a'], 'Unit').parts[0]).toEqual({
			kind: 'text',
			html: '<p><a href="/learn">x</a></p>'
		}));

	it('lets nothing through that runs', () =>
		expect(
			JSON.stringify(renderLesson('<script>x()</script>\n\n<img src=x onerror=x()>', [], 'U'))
		).not.toMatch(/script|onerror|img/));
});
