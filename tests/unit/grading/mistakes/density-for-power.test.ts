import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

describe('density-for-power', () => {
	const drawn = drawnFrom('power-of-a-spread-sensor', 3);
	const made = madeOnBench(drawn, 'power-per-100-khz', 'density-for-power');

	it('is 10 log of the width below what is asked: 50 dB for 100 kHz', () =>
		expect(made.predicted.value - made.question.truth).toBeCloseTo(-50, 6));

	it('gives on the bench what theory says', () =>
		expect(Math.abs(made.value - made.predicted.value)).toBeLessThan(0.4));

	it('is named, with its reading and from the log alone', () => {
		expect(made.named).toEqual(['density-for-power']);
		expect(made.namedFromLog).toEqual(['density-for-power']);
	});
});
