/** `npm test`: every test there is, from nothing but Node.js. Ends with `N passed, N failed`, alone on its line. */
import { requireProgram } from './ground/debian-package.js';
import { runCommand } from './ground/ending';
import { step } from './ground/step.js';
import { runBrowserTests } from './testing/browser-tests';
import { type Count, exitCodeOf, none, sum, summaryLine } from './testing/count';
import { runVitest } from './testing/reports';

await runCommand(async () => {
	await step('MariaDB', () => requireProgram('mariadbd', 'mariadb-server'));
	await step('Chromium', () => process.env.CHROMIUM ?? requireProgram('chromium', 'chromium'));
	console.log('\nUnit, reference and integration tests\n');
	const counts = [await runVitest(['--coverage'])];
	console.log('\nBrowser tests\n');
	counts.push(await runBrowserTests([]).catch(asFailure));
	const total = sum(counts);
	if (total.skipped > 0) console.log(`\n${total.skipped} skipped`);
	return { code: exitCodeOf(total), lastLine: summaryLine(total) };
}, 130);

/** What keeps the browser tests from running at all is a failure like any other. */
function asFailure(error: unknown): Count {
	console.error(error);
	return { ...none, failed: 1 };
}
