import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foldedDiff, lineDiff } from '$lib/components/desk/line-diff';

const text = fc
	.array(fc.constantFrom('a', 'b', 'c', ''), { minLength: 1, maxLength: 12 })
	.map((lines) => lines.join('\n'));
const side = (before: string, after: string, left: 'gone' | 'new') =>
	lineDiff(before, after)
		.filter(({ kind }) => kind !== left)
		.map((line) => line.text)
		.join('\n');

describe('lineDiff(before, after)', () => {
	it('holds both texts, whatever they are', () =>
		fc.assert(
			fc.property(text, text, (before, after) => {
				expect(side(before, after, 'new')).toBe(before);
				expect(side(before, after, 'gone')).toBe(after);
			})
		));

	it('keeps every line that stayed', () => {
		expect(lineDiff('a\nb\nc', 'a\nx\nc\nd').map(({ kind, text: line }) => `${kind} ${line}`)).toEqual([
			'same a',
			'gone b',
			'new x',
			'same c',
			'new d'
		]);
	});

	it('leaves long runs that stayed out', () => {
		const before = Array.from({ length: 30 }, (_, i) => String(i)).join('\n');
		const folded = foldedDiff(lineDiff(before, before.replace('15', 'x')));
		expect(folded.map((line) => line?.text ?? '⋯')).toEqual([
			'⋯',
			'12',
			'13',
			'14',
			'15',
			'x',
			'16',
			'17',
			'18',
			'⋯'
		]);
	});
});
