/** Mistakes about depth and deviation: what theory says of each is what the bench gives when it is made there. */
import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const cases: [slug: string, seed: number, question: string, mistake: string, way: 'high' | 'low'][] = [
	['depth-of-a-village-transmitter', 2, 'depth', 'narrow-for-depth 1000', 'low'],
	['depth-of-a-village-transmitter', 2, 'depth', 'power-for-voltage', 'low'],
	['depth-of-a-village-transmitter', 2, 'carrier', 'crest-for-carrier 30000', 'high'],
	['deviation-of-a-harbour-channel', 2, 'deviation', 'small-index-rule', 'high'],
	['deviation-of-a-harbour-channel', 2, 'deviation', 'width-for-deviation', 'high'],
	['carrier-that-vanished', 2, 'deviation', 'other-null', 'low'],
	['carrier-that-vanished', 2, 'power', 'one-line-for-all', 'low']
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
