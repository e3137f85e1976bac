/**
 * `npm run bench:page`: what the bench page costs. Opens it in headless Chromium with four traces of 1001 points and eight
 * markers, and prints the main thread's work per frame and the time from a set-up change to the first new frame, each with
 * its ratio to what is wanted. Every server and database is made for the run.
 */
import { cpus, loadavg } from 'node:os';
import { runCommand } from './ground/ending';
import { openLoadedBench } from './page-speed/open-loaded-bench';
import { frameWorkMs } from './page-speed/frame-work';
import { setUpChangesMs } from './page-speed/set-up-changes';
import { quantile } from './page-speed/quantile';
import { withBuiltServer } from './testing/browser-tests';

const WANTED_FRAME_MS = 8;
const WANTED_CHANGE_MS = 150;
const MEASURE_MS = 8000;
const CHANGES = 20;

function print(what: string, valuesMs: number[], wantedMs: number): void {
	const cells = [0.5, 0.95].map((share) => {
		const ms = quantile(valuesMs, share);
		return `${ms.toFixed(1).padStart(7)} ms (${(ms / wantedMs).toFixed(2)} of ${wantedMs})`;
	});
	console.log(`${what.padEnd(42)} median ${cells[0]}   p95 ${cells[1]}   n ${valuesMs.length}`);
}

await runCommand(async () => {
	await withBuiltServer(async (origin, chromiumPath) => {
		const { browser, page } = await openLoadedBench(origin, chromiumPath);
		try {
			const work = await frameWorkMs(page, MEASURE_MS);
			const changes = await setUpChangesMs(page, CHANGES);
			console.log(`\n${cpus()[0].model}, load ${loadavg()[0].toFixed(1)}; four traces, eight markers`);
			print('main thread per frame, processor time', work.processorMs, WANTED_FRAME_MS);
			print('main thread per frame, wall time', work.wallMs, WANTED_FRAME_MS);
			print('set-up change to first new frame', changes, WANTED_CHANGE_MS);
		} finally {
			await browser.close();
		}
	});
	return 0;
}, 130);
