/** Mistakes about skirts, spurs and ratios to noise: what theory says of each is what the bench gives when it is made there. */
import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const cases: [slug: string, seed: number, question: string, mistake: string, way: 'high' | 'low'][] = [
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'own-phase-noise', 'high'],
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'skirt-of-the-filter 10000', 'high'],
	['skirts-of-a-synthesiser', 2, 'phase-noise', 'not-per-width', 'high'],
	['spur-inside-a-skirt', 2, 'difference', 'spur-under-skirt 3000', 'high'],
	['beacon-over-its-noise', 2, 'ratio', 'floor-in-ratio 20', 'low'],
	['beacon-over-its-noise', 2, 'ratio', 'not-per-width', 'high'],
	['beacon-over-its-noise', 2, 'ratio', 'other-noise-width 250000', 'low']
];

describe.each(cases)('%s, seed %d, %s: %s', (slug, seed, question, mistake, way) => {
	const made = madeOnBench(drawnFrom(slug, seed), question, mistake);

	it(`reads ${way}, by what theory says`, () => {
		expect(Math.abs(made.value - made.predicted.value)).toBeLessThan(4 * made.predicted.spread);
		const error = made.predicted.value - made.question.truth;
		expect(Math.sign(error)).toBe(way === 'high' ? 1 : -1);
		expect(Math.abs(error)).toBeGreaterThan(made.question.tolerance);
	});

	it('is named, from its reading and from the log alone', () => {
		expect(made.named).toEqual([mistake]);
		expect(made.namedFromLog).toEqual([mistake]);
	});
});
