import { describe, expect, it } from 'vitest';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { memoSweeps } from '$lib/server/bench/proof/memo-sweeps';
import { proofTable } from '$lib/server/bench/proof/proof-table';
import type { Outcome } from '$lib/server/bench/proof/outcome';
import { proveSeed, type SeedProof } from '$lib/server/bench/proof/prove-seed';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { changedExercise, firstExercise } from '../../factories/first-exercise';

describe('proveSeed(exercise, seed, sweepWith)', () => {
	const proof = proveSeed(firstExercise, 4, prepareSweep);

	it('does the taught method and makes every mistake of every question', () => {
		const asked = firstExercise.questions.reduce(
			(sum, question) => sum + 1 + (question.type === 'number' ? question.mistakes.length : 0),
			0
		);
		expect(proof.outcomes).toHaveLength(asked);
		expect(proof.outcomes.every(({ error }) => error !== null)).toBe(true);
	});

	it('is the same again', () => expect(proveSeed(firstExercise, 4, prepareSweep)).toEqual(proof));

	it('finds a tolerance too tight for the level error and three spreads', () => {
		const tight = changedExercise((d) => (d.questions[0].tolerance.absolute = 0.72));
		expect(proveSeed(tight, 4, prepareSweep).tooTight.map(({ question }) => question)).toEqual([
			'channel-power'
		]);
		expect(proof.tooTight).toEqual([]);
	});
});

describe('memoSweeps(sweepWith)', () => {
	it('changes nothing that is read', () => {
		const drawn = drawExercise(firstExercise, 9);
		const memo = memoSweeps(prepareSweep);
		const direct = runMethod(drawn, drawn.method, prepareSweep).record;
		expect(runMethod(drawn, drawn.method, memo).record).toEqual(direct);
		expect(runMethod(drawn, drawn.method, memo).record).toEqual(direct);
	});
});

describe('proofTable(exercise, fromSeed, proofs, tolerances)', () => {
	const taught = (error: number): Outcome => ({
		question: 'q',
		mistake: null,
		error,
		bias: error,
		spread: 0.1,
		passes: Math.abs(error) <= 1,
		named: true
	});
	const made = (over: Partial<Outcome>): Outcome => ({
		...taught(-5),
		mistake: 'haste',
		passes: false,
		...over
	});
	const seeds = (count: number, outcomes: (i: number) => Outcome[], spreads = 9): SeedProof[] =>
		Array.from({ length: count }, (_, seed) => ({
			seed,
			redraws: 0,
			outcomes: outcomes(seed),
			nearest: [{ question: 'q', spreads }],
			tooTight: []
		}));
	const table = (proofs: SeedProof[]) => proofTable('e', 0, proofs, new Map([['q', 1]]));
	/** Errors that scatter by 0.3 about nothing. */
	const fair = (i: number) => taught(0.3 * Math.sin(i * 2.4));

	it('passes when the method is right and the mistake wrong and named', () =>
		expect(table(seeds(200, (i) => [fair(i), made({})])).passed).toBe(true));

	it('fails when the taught method passes on fewer than 99 %', () =>
		expect(table(seeds(200, (i) => [i < 3 ? taught(1.1) : fair(i), made({})])).failures).toEqual([
			expect.stringContaining('the taught method passes on 98.5 %')
		]));

	it('fails when the taught method is biased, though it passes', () =>
		expect(table(seeds(200, () => [taught(0.4), made({})])).failures).toEqual([
			expect.stringContaining('off by 0.40 on average')
		]));

	it('fails when a mistake passes on more than 5 %', () =>
		expect(table(seeds(200, (i) => [fair(i), made({ passes: i < 11 })])).failures).toEqual([
			expect.stringContaining('haste passes on 5.5 %')
		]));

	it('fails when a mistake is named on fewer than 95 %', () =>
		expect(table(seeds(200, (i) => [fair(i), made({ named: i >= 11 })])).failures).toEqual([
			expect.stringContaining('haste is named on 94.5 %')
		]));

	it('fails when a mistake can’t be made', () =>
		expect(
			table(seeds(200, (i) => [fair(i), made(i < 5 ? { error: null, problem: 'rbwHz: no' } : {})])).failures
		).toContainEqual(expect.stringContaining('could be made on 97.5 % only (rbwHz: no)')));

	it('fails when mistakes come within four spreads of each other', () =>
		expect(table(seeds(200, (i) => [fair(i), made({})], 3.9)).failures).toEqual([
			expect.stringContaining('4 spreads apart on 0.0 %')
		]));
});
