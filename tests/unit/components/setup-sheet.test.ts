import { expect, it } from 'vitest';
import type { Frame } from '$lib/schemas/frames';
import type { BenchView } from '$lib/schemas/attempt';
import type { Settings } from '$lib/schemas/settings';
import { SetupSheet } from '$lib/components/bench/state/setup-sheet.svelte';
import { SweepRun } from '$lib/components/bench/state/sweep-run.svelte';
import { TraceSet } from '$lib/components/bench/state/trace-set.svelte';
import { resolved } from './resolved-settings';
import { waiting, wireOf } from './bench-wire-of';

const bench: BenchView = {
	...{ settings: {}, resolved, setUp: 0, nextRow: 0, drawnTo: null, resumeFrom: 0, restartRow: 0 },
	...{ clockS: 0, benchTimeUsedS: 0, flags: [], protectionTripped: false }
};

it('a step taken while a set-up is on its way is asked for after it, and never lost', async () => {
	const first = waiting<AsyncIterable<Frame[]>>();
	const asked: Settings[] = [];
	const run = new SweepRun(
		bench,
		new TraceSet(),
		wireOf({
			sweeps: ({ settings }) => (
				asked.push(settings),
				asked.length === 1 ? first.promise : new Promise(() => undefined)
			)
		})
	);
	const sheet = new SetupSheet(run);
	const typed = sheet.set('spanHz', 100e3, '100k');
	sheet.step('spanHz', 200e3, '');
	first.resolve((async function* () {})());
	await typed;
	expect(sheet.expected.spanHz).toBe(200e3);
	await new Promise((then) => setTimeout(then, 150));
	expect(asked.map(({ spanHz }) => spanHz)).toEqual([100e3, 200e3]);
	run.stop();
});
