import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SweepRun } from '$lib/components/bench/state/sweep-run.svelte';
import { TraceSet } from '$lib/components/bench/state/trace-set.svelte';
import { Refusal, type BenchWire } from '$lib/components/bench/state/bench-wire';
import type { AttemptView, BenchView } from '$lib/schemas/attempt';
import { resolved } from './resolved-settings';
import { waiting, wireOf } from './bench-wire-of';

const bench: BenchView = {
	...{ settings: {}, resolved, setUp: 0, nextRow: 0, drawnTo: null, resumeFrom: 0, restartRow: 0 },
	...{ clockS: 0, benchTimeUsedS: 0, flags: [], protectionTripped: false }
};
const runWith = (does: Partial<BenchWire>) => new SweepRun(bench, new TraceSet(), wireOf(does));

beforeEach(() => vi.stubGlobal('requestAnimationFrame', (then: () => void) => setTimeout(then, 0)));
afterEach(() => vi.unstubAllGlobals());

describe('SweepRun.settleAcknowledgement(row)', () => {
	it('tells what was drawn one after another: whoever waits knows that nothing is still on its way', async () => {
		const first = waiting<void>();
		const told: number[] = [];
		const run = runWith({
			acknowledge: (row) => (told.push(row), row === 3 ? first.promise : Promise.resolve())
		});
		const early = run.settleAcknowledgement(3);
		await vi.waitFor(() => expect(told).toEqual([3]));
		let settled = false;
		const late = run.settleAcknowledgement(5).then(() => (settled = true));
		await new Promise((then) => setTimeout(then, 20));
		expect([told, settled]).toEqual([[3], false]);
		first.resolve();
		await Promise.all([early, late]);
		expect(told).toEqual([3, 5]);
	});

	it('tells nothing once the attempt is closed', async () => {
		const told: number[] = [];
		const run = runWith({ acknowledge: (row) => (told.push(row), Promise.resolve()) });
		run.closed = true;
		await run.settleAcknowledgement(3);
		run.stop();
		expect(told).toEqual([]);
	});
});

describe('SweepRun.start()', () => {
	it('finds out that the attempt was handed in on another page, and rests', async () => {
		const run = runWith({
			sweeps: () => Promise.reject(new Refusal(409, 'This attempt has been handed in.')),
			reload: () => Promise.resolve({ state: 'closed', bench } as AttemptView)
		});
		await run.start();
		expect([run.closed, run.running]).toEqual([true, false]);
	});
});
