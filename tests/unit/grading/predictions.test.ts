/** What theory says of a mistake is what the bench gives when it is made there: the exercises of units 4 and 5. */
import { numberAnswers } from '$lib/server/bench/exercise/attempt-record';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { predictMistake } from '$lib/server/bench/grading/predict-mistake';
import { ownError } from '$lib/server/bench/grading/own-error';
import { watchedMistakes } from '$lib/server/bench/grading/watched-mistakes';
import { contentExercise } from '../../factories/content-exercise';

const SEEDS = [1, 2, 3];
const slugs = [
	'noise-at-a-harbour-antenna',
	'weak-carrier-from-an-outstation',
	'faded-hop',
	'two-on-one-channel',
	'block-and-control-tone'
];

const made = slugs.flatMap((slug) => {
	const exercise = contentExercise(slug);
	return SEEDS.flatMap((seed) => {
		const drawn = drawExercise(exercise, seed);
		return numberQuestions(drawn).flatMap((question) =>
			watchedMistakes(question).map((watched) => ({ slug, seed, drawn, question, watched }))
		);
	});
});
const kinds = [...new Set(made.map(({ watched }) => watched.kind))].sort();

describe.each(kinds)('%s', (kind) => {
	const ofKind = made.filter(({ watched }) => watched.kind === kind);

	it('gives on the bench what theory says of it', () => {
		for (const { drawn, question, watched, slug, seed } of ofKind) {
			const context = { drawn, question };
			const predicted = predictMistake(watched, context)!;
			const { record } = runMethod(drawn, watched.mistake.make(drawn.method, context));
			const off = numberAnswers(record)[question.id].value - ownError(context) - predicted.value;
			expect(Math.abs(off), `${slug}, ${question.id}, seed ${seed}`).toBeLessThan(3 * predicted.spread);
		}
	});
});
