import { describe, expect, it } from 'vitest';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { drawnFrom, madeOnBench } from '../../../factories/made-on-bench';

const DRAWN = {
	'leakage-of-a-hop': drawnFrom('leakage-of-a-hop', 2),
	'empty-channel-below': drawnFrom('empty-channel-below', 4)
};

/** Mistakes made beside a strong signal, and whether they make the leakage read high or low. */
const MADE = [
	['leakage-of-a-hop', 'ratio', 'own-products 10', 'high'],
	['leakage-of-a-hop', 'ratio', 'own-noise 40', 'high'],
	['leakage-of-a-hop', 'ratio', 'neighbour-width 7000000', 'low'],
	['leakage-of-a-hop', 'ratio', 'wrong-offset 14000000', 'high'],
	['leakage-of-a-hop', 'ratio', 'level-for-ratio', 'high'],
	['leakage-of-a-hop', 'ratio', 'markers-for-bands', 'low'],
	['leakage-of-a-hop', 'leakage', 'own-products 10', 'high'],
	['empty-channel-below', 'below', 'own-products 0', 'high'],
	['empty-channel-below', 'below', 'own-noise 50', 'high'],
	['empty-channel-below', 'below', 'other-side', 'high']
] as const;

describe.each(MADE)('%s, %s: %s', (slug, questionId, id, errs) => {
	const made = madeOnBench(DRAWN[slug], questionId, id);
	const { question, value, predicted } = made;

	it('gives on the bench what theory says, within four of its spreads', () =>
		expect(Math.abs(value - predicted.value)).toBeLessThan(4 * predicted.spread));

	it(`makes the leakage read ${errs}, beyond the tolerance`, () => {
		expect(Math.abs(value - question.truth)).toBeGreaterThan(question.tolerance);
		expect(value > question.truth).toBe(errs === 'high');
	});

	it('is named, with its reading and from the log alone', () => {
		expect(made.named).toEqual([id]);
		expect(made.namedFromLog).toEqual([id]);
	});
});

describe('the taught method beside a strong signal', () => {
	it.each(Object.values(DRAWN))('is right, and its finding plays it again', (drawn) => {
		const finding = gradeAnswer({ drawn, ...runMethod(drawn).record });
		expect(finding.questions.map(({ verdict }) => verdict)).toEqual(drawn.questions.map(() => 'right'));
		expect(finding.passed).toBe(true);
	});
});
