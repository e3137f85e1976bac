/** Every mistake watched in units 1 to 3: what theory says of it is what the bench gives when it is made there, and it is named. */
import { numberFindings } from '../../../factories/number-findings';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { worthAStep } from '$lib/server/bench/grading/spreads';
import { watchedMistakes } from '$lib/server/bench/grading/watched-mistakes';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const SEEDS = [1, 2];
const slugs = [
	'power-behind-a-coupler',
	'line-that-carries-its-own-supply',
	'strongest-and-its-neighbour',
	'carrier-frequency-by-count',
	'pilot-beside-its-carrier',
	'carrier-in-a-skirt',
	'sweep-that-takes-its-time'
];
const drawnOnes = slugs.flatMap((slug) => SEEDS.map((seed) => drawnFrom(slug, seed)));
const watchedOnes = drawnOnes.flatMap((drawn) =>
	numberQuestions(drawn).flatMap((question) =>
		watchedMistakes(question).map((watched) => ({ drawn, question, watched }))
	)
);
const kinds = [...new Set(watchedOnes.map(({ watched }) => watched.kind))].sort();

describe.each(kinds)('%s', (kind) => {
	const ofKind = watchedOnes.filter(({ watched }) => watched.kind === kind);

	it('gives on the bench what theory says of it, and is named with its reading and from the log alone', () => {
		for (const { drawn, question, watched } of ofKind) {
			const where = `${drawn.exercise.slug}, ${question.id}, seed ${String(drawn.seed)}`;
			const made = madeOnBench(drawn, question.id, watched.id);
			expect(Math.abs(made.value - made.predicted.value), where).toBeLessThan(3 * made.predicted.spread);
			expect(made.named, where).toEqual([watched.id]);
			expect(made.namedFromLog, where).toEqual([watched.id]);
		}
	});

	it('is explained with the learner’s own numbers', () => {
		const [{ drawn, question, watched }] = ofKind;
		const { record } = runMethod(drawn, watched.mistake.make(drawn.method, { drawn, question }));
		const finding = numberFindings(gradeAnswer({ drawn, ...record })).find(({ id }) => id === question.id)!;
		expect(finding.mistakes).toHaveLength(1);
		const [{ title, text, sum }] = finding.mistakes;
		expect(`${title} ${text} ${sum}`).not.toMatch(/undefined|NaN|Infinity|too much|too far/);
		expect(sum).toMatch(/\d/);
		const end = finding.ladder!.parts.at(-1)!.to;
		expect(Math.abs(end - question.truth)).toBeLessThanOrEqual(worthAStep(question));
	});
});

describe('a right answer of units 1 to 3', () => {
	it.each(slugs)('%s: is right, and by a method that can support it', (slug) => {
		const drawn = drawnFrom(slug, 3);
		const { questions } = gradeAnswer({ drawn, ...runMethod(drawn).record });
		expect(questions.map(({ verdict }) => verdict)).toEqual(questions.map(() => 'right'));
	});
});
