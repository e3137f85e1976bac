/** `npm run test:e2e -- [files and options of Playwright]`: the browser tests alone, with all that they need. */
import { runCommand } from './ground/ending';
import { runBrowserTests } from './testing/browser-tests';
import { exitCodeOf } from './testing/count';

await runCommand(async () => exitCodeOf(await runBrowserTests(process.argv.slice(2))), 130);
