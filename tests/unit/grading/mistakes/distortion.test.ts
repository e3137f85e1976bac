/** Mistakes about harmonics and intermodulation: what theory says of each is what the bench gives when it is made there. */
import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const cases: [slug: string, seed: number, question: string, mistake: string, way: 'high' | 'low'][] = [
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'untested-products 0', 'high'],
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'other-harmonic 3', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'second', 'harmonic-level-for-ratio', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'distortion', 'power-for-voltage', 'low'],
	['harmonics-of-a-harbour-transmitter', 2, 'distortion', 'strongest-alone', 'low'],
	['intercept-of-a-mast-amplifier', 3, 'intercept', 'untested-products 20', 'low'],
	['intercept-of-a-mast-amplifier', 3, 'intercept', 'difference-not-halved', 'high'],
	['intercept-of-a-mast-amplifier', 3, 'product', 'untested-products 20', 'high']
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
