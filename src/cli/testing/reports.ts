import { existsSync, readFileSync, rmSync } from 'node:fs';
import { startNode } from '../ground/child';
import { type Count, countPlaywright, countVitest, none, withExitCode } from './count';

const VITEST_REPORT = '.data/test/vitest.json';
const PLAYWRIGHT_REPORT = '.data/test/playwright.json';

/** Unit, reference and integration tests, with the coverage of the pure rooms. */
export async function runVitest(args: string[]): Promise<Count> {
	rmSync(VITEST_REPORT, { force: true });
	const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${VITEST_REPORT}`];
	const child = startNode(['node_modules/vitest/vitest.mjs', 'run', ...reporters, ...args]);
	return counted(VITEST_REPORT, await child.ended, countVitest);
}

/** The tests in the browser, against the server at `origin`. */
export async function runPlaywright(args: string[], origin: string, chromium: string): Promise<Count> {
	rmSync(PLAYWRIGHT_REPORT, { force: true });
	const child = startNode(
		['node_modules/@playwright/test/cli.js', 'test', '--config', 'tests/e2e/playwright.config.ts', ...args],
		{
			E2E_ORIGIN: origin,
			CHROMIUM: chromium,
			PLAYWRIGHT_JSON_OUTPUT_FILE: `${process.cwd()}/${PLAYWRIGHT_REPORT}`
		}
	);
	return counted(PLAYWRIGHT_REPORT, await child.ended, countPlaywright);
}

function counted<Report>(path: string, exitCode: number, count: (report: Report) => Count): Count {
	const report = existsSync(path) ? count(JSON.parse(readFileSync(path, 'utf8')) as Report) : none;
	return withExitCode(report, exitCode);
}
