import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findIn } from '$lib/server/domain/find/find-in';

const documents = [
	{ title: 'Noise figure', text: 'By how many decibels a receiver is noisier than a matched resistor.' },
	{
		title: 'The floor',
		text: 'Every receiver hisses by itself. Its noise figure says by how much. A floor of −151.4 dBm/Hz.'
	},
	{ title: 'Résumé of noise', text: 'Noise, noise and noise again: the figure comes later.' },
	{ title: 'Pad', text: 'A fixed attenuator.' }
];
const titles = (query: string) => findIn(documents, query).map(({ document }) => document.title);
const hits = (parts: { text: string; hit: boolean }[]) =>
	parts.filter(({ hit }) => hit).map(({ text }) => text);

describe('findIn(documents, query)', () => {
	it('finds what has every word, as the beginning of a word, in title or text', () => {
		expect(titles('receiver hiss')).toEqual(['The floor']);
		expect(titles('eceiver')).toEqual([]);
		expect(titles('pad receiver')).toEqual([]);
	});

	it('puts a title that is the query first, then titles with its words, then texts', () => {
		expect(titles('noise figure')).toEqual(['Noise figure', 'Résumé of noise', 'The floor']);
	});

	it('minds neither capitals nor accents, and finds numbers with their decimals', () => {
		expect(titles('RESUME')).toEqual(['Résumé of noise']);
		expect(titles('151.4')).toEqual(['The floor']);
		expect(titles('51.4')).toEqual([]);
	});

	it('marks what was asked for, and leaves every text as it was', () => {
		const [found] = findIn(documents, 'noise figure').filter(
			({ document }) => document.title === 'The floor'
		);
		expect(hits(found.excerpt)).toEqual(['noise', 'figure']);
		fc.assert(
			fc.property(fc.string(), fc.constantFrom('a', 'é 1', 'the of'), (title, query) => {
				for (const one of findIn([{ title, text: title }], query))
					expect(one.title.map(({ text }) => text).join('')).toBe(title);
			})
		);
	});

	it('cuts a long text around the first hit', () => {
		const long = { title: 'Long', text: `${'word '.repeat(100)}needle ${'word '.repeat(100)}` };
		const [{ excerpt }] = findIn([long], 'needle');
		const text = excerpt.map((part) => part.text).join('');
		expect(text).toContain('needle');
		expect(text.length).toBeLessThan(200);
		expect(text.startsWith('… word')).toBe(true);
	});

	it('finds nothing for nothing', () => {
		expect(findIn(documents, '')).toEqual([]);
		expect(findIn(documents, ' +-*/%_ ')).toEqual([]);
	});
});
