/** What every mistake watched owes: theory says of it what the bench gives when it is made there, and it is named. */
import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from './made-on-bench';

/** An exercise and its seed, the question, the mistake watched on it, and which way it reads. */
type Case = [slug: string, seed: number, question: string, mistake: string, way: 'high' | 'low'];

export function promiseOfMistakes(cases: Case[]): void {
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
}
