/** Mistakes about pulses: what theory says of each is what the bench gives when it is made there. */
import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const cases: [slug: string, seed: number, question: string, mistake: string, way: 'high' | 'low'][] = [
	['radar-seen-from-afar', 2, 'level', 'pulse-desensitised 100000', 'low'],
	['lines-of-an-altimeter', 2, 'repetition', 'spikes-for-lines 300000', 'high'],
	['long-pulses-over-time', 2, 'width', 'narrow-for-pulse 3000', 'high'],
	['long-pulses-over-time', 2, 'level', 'pulse-desensitised 3000', 'low']
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
