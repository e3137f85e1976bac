/** Counts of one kind of tests. A failure that belongs to no single test (a file that doesn't load) counts as one. */
export interface Count {
	passed: number;
	failed: number;
	skipped: number;
}

export const none: Count = { passed: 0, failed: 0, skipped: 0 };

export function sum(counts: Count[]): Count {
	return counts.reduce(
		(total, count) => ({
			passed: total.passed + count.passed,
			failed: total.failed + count.failed,
			skipped: total.skipped + count.skipped
		}),
		none
	);
}

/** The last line of `npm test`. */
export const summaryLine = ({ passed, failed }: Count): string => `${passed} passed, ${failed} failed`;

/** Success needs at least one test that ran, and none that failed. */
export const exitCodeOf = ({ passed, failed }: Count): number => (failed === 0 && passed > 0 ? 0 : 1);

/** The part of Vitest's JSON report that is counted. */
export interface VitestReport {
	numPassedTests: number;
	numFailedTests: number;
	numPendingTests: number;
	numTodoTests: number;
	testResults: { status: string; assertionResults: { status: string }[] }[];
}

/** A test that was found and never ended (its process died) has failed, though its file is called passed. */
export function countVitest(report: VitestReport): Count {
	const has = (file: VitestReport['testResults'][number], status: string) =>
		file.assertionResults.some((assertion) => assertion.status === status);
	const broken = report.testResults.filter((file) => file.status === 'failed' && !has(file, 'failed'));
	const cutOff = report.testResults.flatMap(({ assertionResults }) =>
		assertionResults.filter(({ status }) => status === 'pending')
	);
	return {
		passed: report.numPassedTests,
		failed: report.numFailedTests + broken.length + cutOff.length,
		skipped: report.numPendingTests + report.numTodoTests
	};
}

/** The part of Playwright's JSON report that is counted. A flaky test failed once: it counts as failed. */
export interface PlaywrightReport {
	stats: { expected: number; unexpected: number; flaky: number; skipped: number };
	errors: unknown[];
}

export function countPlaywright({ stats, errors }: PlaywrightReport): Count {
	return {
		passed: stats.expected,
		failed: stats.unexpected + stats.flaky + errors.length,
		skipped: stats.skipped
	};
}

/** A run whose exit code tells of a failure that its report doesn't, has one failure more. */
export function withExitCode(count: Count, exitCode: number): Count {
	return exitCode !== 0 && count.failed === 0 ? { ...count, failed: 1 } : count;
}
