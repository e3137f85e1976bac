import { describe, expect, it } from 'vitest';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

/** Mistakes made with widths: exercise, question, mistake, and which way it errs. */
const MADE = [
	['width-of-a-telemetry-carrier', 'occupied-bandwidth', 'width-at-level 3', 'narrow'],
	['width-of-a-telemetry-carrier', 'occupied-bandwidth', 'wide-resolution 3000', 'wide'],
	['width-of-a-telemetry-carrier', 'occupied-bandwidth', 'own-noise 40', 'wide'],
	['width-of-a-telemetry-carrier', 'upper-end', 'edge-from-width', 'either'],
	['width-beside-a-gateway', 'occupied-bandwidth', 'window-too-wide 1000000', 'wide'],
	['width-beside-a-gateway', 'occupied-bandwidth', 'width-at-level 26', 'wide'],
	['width-beside-a-gateway', 'occupied-bandwidth', 'width-of-share 90', 'narrow'],
	['width-beside-a-gateway', 'width-26-db', 'width-of-share 99', 'narrow'],
	['width-beside-a-gateway', 'width-26-db', 'window-too-wide 1000000', 'wide']
] as const;

describe.each(MADE)('%s, %s: %s', (slug, questionId, id, errs) => {
	const made = madeOnBench(drawnFrom(slug, 5), questionId, id);
	const { question, value, predicted } = made;

	it('gives on the bench what theory says, within four of its spreads', () =>
		expect(Math.abs(value - predicted.value)).toBeLessThan(4 * predicted.spread));

	it(`errs beyond the tolerance, and ${errs}`, () => {
		expect(Math.abs(value - question.truth)).toBeGreaterThan(question.tolerance);
		if (errs !== 'either') expect(value > question.truth).toBe(errs === 'wide');
	});

	it('is named, with its reading and from the log alone', () => {
		expect(made.named).toEqual([id]);
		expect(made.namedFromLog).toEqual([id]);
	});
});
