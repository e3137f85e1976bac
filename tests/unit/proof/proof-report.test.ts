import { describe, expect, it } from 'vitest';
import { entryOf, reportEntry, updatedReport } from '$lib/server/bench/proof/proof-report';
import type { ProofRow, ProofTable } from '$lib/server/bench/proof/proof-table';

const row = (over: Partial<ProofRow>): ProofRow => ({
	question: 'q',
	mistake: null,
	done: 200,
	numbers: 200,
	passShare: 1,
	namedShare: 1,
	meanError: 0,
	bias: 0,
	scatter: 0,
	edgeError: 0,
	failures: [],
	...over
});
const table: ProofTable = {
	exercise: 'one',
	fromSeed: 1,
	seeds: 200,
	redraws: 0,
	rows: [
		row({ passShare: 0.995 }),
		row({ mistake: 'a', passShare: 0.02, namedShare: 0.985 }),
		row({ mistake: 'b', passShare: 0, namedShare: 0.9704 })
	],
	apartShare: 1,
	failures: [],
	passed: true
};
const sha256 = 'a'.repeat(64);
const entry = entryOf('course/01-unit/one', sha256, table);

describe('entryOf(exercise, sha256, table)', () => {
	it('says the worst of each', () =>
		expect(entry).toEqual({
			exercise: 'course/01-unit/one',
			sha256,
			seeds: 200,
			taughtPasses: 0.995,
			mistakePasses: 0.02,
			named: 0.97,
			apart: 1
		}));

	it('is no report of what is not proven, or over too few seeds', () => {
		expect(reportEntry.safeParse(entry).success).toBe(true);
		for (const short of [{ seeds: 199 }, { taughtPasses: 0.98 }, { mistakePasses: 0.06 }, { named: 0.94 }])
			expect(reportEntry.safeParse({ ...entry, ...short }).success).toBe(false);
	});
});

describe('updatedReport(report, proven, existing)', () => {
	const named = (exercise: string) => ({ ...entry, exercise });

	it('takes what was proven now, keeps the others in order, and forgets what is gone', () => {
		const again = { ...named('b'), seeds: 400 };
		expect(updatedReport(['a', 'b', 'gone'].map(named), [named('c'), again], ['c', 'b', 'a'])).toEqual([
			named('a'),
			again,
			named('c')
		]);
	});
});
