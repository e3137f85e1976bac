/** Every exercise of content/ is sound, over a few seeds here and over 200 by `npm run proof`. */
import { describe, expect, it } from 'vitest';
import { proveExercise } from '$lib/server/bench/proof/prove-exercise';
import { contentExercise, contentSlugs } from '../factories/content-exercise';

const SEEDS = 3;

describe.each(contentSlugs)('%s', (slug) => {
	it(`is proven over ${SEEDS} seeds`, { timeout: 120_000 }, () => {
		const exercise = contentExercise(slug);
		expect(exercise.slug).toBe(slug);
		expect(proveExercise(exercise, { seeds: SEEDS, fromSeed: 1 }).failures).toEqual([]);
	});
});
