import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { describe, expect, it } from 'vitest';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { evidences, type MadeAnswer } from '$lib/server/bench/proof/misdiagnosis/made-answer';
import { makeAnswers } from '$lib/server/bench/proof/misdiagnosis/make-answers';
import { misdiagnosisTable } from '$lib/server/bench/proof/misdiagnosis/misdiagnosis-table';
import { typed } from '$lib/server/bench/proof/misdiagnosis/typed';
import { varyMethod } from '$lib/server/bench/proof/misdiagnosis/vary-method';
import { Random } from '$lib/server/bench/receiver/random';
import { firstExercise } from '../../factories/first-exercise';

describe('makeAnswers(exercise, range)', () => {
	const range = { fromAnswer: 0, answers: 10 };
	const answers = makeAnswers(firstExercise, range);

	it('makes each on the bench, one in five without a mistake', () => {
		expect(answers.map(({ verdict }) => verdict)).not.toContain(null);
		expect(answers.filter(({ mistake }) => mistake === null).map(({ answer }) => answer)).toEqual([0, 5]);
		expect(new Set(answers.flatMap(({ mistake }) => mistake ?? [])).size).toBe(8);
	});

	it('makes the same again, in any order', () =>
		expect(makeAnswers(firstExercise, { fromAnswer: 7, answers: 2 })).toEqual(answers.slice(7, 9)));

	it('leaves readings attached, unattached and untaken', () => {
		const left = makeAnswers(firstExercise, { fromAnswer: 0, answers: 16 }).map(({ evidence }) => evidence);
		expect(new Set(left)).toEqual(new Set(evidences));
	});
});

describe('varyMethod(steps, …)', () => {
	const drawn = drawExercise(firstExercise, 2);
	const [question] = numberQuestions(drawn);
	const variants = Array.from({ length: 30 }, (_, n) =>
		varyMethod(drawn.method, drawn, question, new Random('vary', n, 'test'), true)
	);
	const settings = variants.map((steps) =>
		steps.flatMap((step) => (step.do === 'set' ? [step.settings] : []))
	);

	it('changes span, filter, points and sweeps', () => {
		for (const key of ['spanHz', 'rbwHz', 'points'] as const)
			expect(new Set(settings.map(([first]) => first[key])).size).toBeGreaterThan(1);
		const sweeps = variants.map((steps) => steps.findLast((step) => step.do === 'sweep'));
		expect(new Set(sweeps.map((step) => JSON.stringify(step))).size).toBeGreaterThan(5);
	});

	it('keeps in view what is read, and widens no filter where the method is sound', () => {
		for (const [{ centreHz, spanHz, rbwHz }] of settings) {
			expect(Math.abs(centreHz! - question.frequencyHz) + 12_500).toBeLessThan(spanHz! / 2);
			expect(rbwHz).toBeLessThanOrEqual(300);
		}
	});
});

describe('typed(value, question, random)', () => {
	const at = (unit: 'dBm' | 'Hz', tolerance: number) =>
		Array.from({ length: 50 }, (_, n) =>
			typed(
				unit === 'Hz' ? 12_345 : -17.4321,
				{ unit, tolerance, digits: unit === 'Hz' ? 0 : 1 } as never,
				new Random('t', n, unit)
			)
		);

	it('keeps what the tolerance needs', () => {
		for (const value of at('dBm', 1)) expect(Math.abs(value + 17.4321)).toBeLessThanOrEqual(0.051);
		for (const value of at('Hz', 20)) expect(Math.abs(value - 12_345)).toBeLessThan(20 / 3);
	});

	it('is now and then three significant digits of what isn’t a level', () =>
		expect(new Set(at('Hz', 500))).toEqual(new Set([12_300, 12_345])));
});

describe('misdiagnosisTable(exercise, answers)', () => {
	const base: MadeAnswer = {
		answer: 1,
		question: 'q',
		mistake: 'haste',
		evidence: 'attached',
		verdict: 'wrong',
		found: ['haste']
	};
	const table = (named: number, others: Partial<MadeAnswer>[]) =>
		misdiagnosisTable('e', [
			...Array.from({ length: named }, () => base),
			...others.map((other) => ({ ...base, ...other }))
		]);

	it('passes at 95 % named and fails below', () => {
		expect(table(95, Array<object>(5).fill({ found: ['sloth'] })).passed).toBe(true);
		expect(table(94, Array<object>(6).fill({ found: [] })).failures[0]).toContain('94.0 %');
	});

	it('counts two mistakes named for one as misnamed', () =>
		expect(table(9, [{ found: ['haste', 'sloth'] }]).namedShare).toBe(0.9));

	it('leaves out what came to a right number, and what could not be made', () => {
		const { namedShare, wrongAnswers, rows } = table(4, [
			{ verdict: 'right', found: [] },
			{ verdict: null, problem: 'x' }
		]);
		expect([namedShare, wrongAnswers]).toEqual([1, 4]);
		expect(rows[0]).toMatchObject({ made: 5, harmless: 1, notMade: 1, problem: 'x' });
	});

	it('fails when more than 1 % of right answers are marked wrong', () => {
		const right = (verdict: MadeAnswer['verdict']) => ({ mistake: null, verdict, found: [] });
		const answers = (wrong: number) => [
			...Array.from({ length: 100 - wrong }, () => right('right')),
			...Array.from({ length: wrong }, () => right('wrong'))
		];
		expect(table(10, answers(1)).passed).toBe(true);
		expect(table(10, answers(2)).failures[0]).toContain('2.0 %');
	});
});
