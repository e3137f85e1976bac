import { describe, expect, it } from 'vitest';
import {
	countPlaywright,
	countVitest,
	exitCodeOf,
	none,
	sum,
	summaryLine,
	withExitCode
} from '../../../src/cli/testing/count';

const testFile = (status: string, ...assertions: string[]) => ({
	status,
	assertionResults: assertions.map((assertion) => ({ status: assertion }))
});
const vitest = (
	numPassedTests: number,
	numFailedTests: number,
	...testResults: ReturnType<typeof testFile>[]
) => ({
	numPassedTests,
	numFailedTests,
	numPendingTests: 1,
	numTodoTests: 1,
	testResults
});

describe('countVitest(report)', () => {
	it('counts a file that does not load as one failure', () => {
		const report = vitest(2, 0, testFile('passed', 'passed', 'passed'), testFile('failed'));
		expect(countVitest(report)).toEqual({ passed: 2, failed: 1, skipped: 2 });
	});

	it('counts a failing test once, not with its file again', () => {
		const report = vitest(1, 1, testFile('failed', 'passed', 'failed'));
		expect(countVitest(report)).toEqual({ passed: 1, failed: 1, skipped: 2 });
	});

	it('counts the tests that a dying process left unfinished', () => {
		expect(countVitest(vitest(1, 0, testFile('passed', 'passed', 'pending', 'pending'))).failed).toBe(2);
	});

	it('counts a file whose hook fails after its tests passed', () => {
		expect(countVitest(vitest(1, 0, testFile('failed', 'passed'))).failed).toBe(1);
	});
});

describe('countPlaywright(report)', () => {
	it('counts a flaky test and an error outside tests as failures', () => {
		const report = { stats: { expected: 4, unexpected: 1, flaky: 1, skipped: 2 }, errors: ['no such file'] };
		expect(countPlaywright(report)).toEqual({ passed: 4, failed: 3, skipped: 2 });
	});
});

describe('withExitCode(count, exitCode)', () => {
	it('adds a failure that only the exit code tells of', () => {
		expect(withExitCode({ ...none, passed: 3 }, 1)).toEqual({ passed: 3, failed: 1, skipped: 0 });
		expect(withExitCode({ ...none, passed: 3 }, 0).failed).toBe(0);
		expect(withExitCode({ ...none, failed: 2 }, 1).failed).toBe(2);
	});
});

describe('the end of npm test', () => {
	it('says the sums in its one line', () => {
		const total = sum([
			{ passed: 3, failed: 0, skipped: 1 },
			{ passed: 4, failed: 2, skipped: 0 }
		]);
		expect(summaryLine(total)).toBe('7 passed, 2 failed');
	});

	it('is a success only if tests ran and none failed', () => {
		expect(exitCodeOf({ passed: 1, failed: 0, skipped: 0 })).toBe(0);
		expect(exitCodeOf({ passed: 1, failed: 1, skipped: 0 })).toBe(1);
		expect(exitCodeOf({ passed: 0, failed: 0, skipped: 5 })).toBe(1);
	});
});
