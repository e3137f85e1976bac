import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SweepRun } from '$lib/components/bench/state/sweep-run.svelte';
import { TraceSet } from '$lib/components/bench/state/trace-set.svelte';
import { Refusal, type BenchWire } from '$lib/components/bench/state/bench-wire';
import type { AttemptView, BenchView } from '$lib/schemas/attempt';
import type { Frame } from '$lib/schemas/frames';
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

describe('SweepRun.change()', () => {
	async function* takenOver(): AsyncIterable<Frame[]> {
		await Promise.resolve();
		const json = { reason: 'taken-over', message: 'Another page has it.', nextRow: 0, benchTimeUsedS: 1 };
		yield [{ type: 'end', json } as Frame];
	}
	async function* silent(signal: AbortSignal): AsyncIterable<Frame[]> {
		await new Promise((then) => signal.addEventListener('abort', then));
		yield [];
	}

	it('takes the receiver back from a request of its own that was given up and came late', async () => {
		const asked: unknown[] = [];
		const run = runWith({
			sweeps: ({ settings }, signal) => {
				asked.push(settings.spanHz);
				// The first is given up before it is answered; the second loses the receiver to it.
				if (asked.length === 1) return new Promise(() => {});
				return Promise.resolve(asked.length === 2 ? takenOver() : silent(signal));
			}
		});
		run.running = true;
		void run.change({ spanHz: 1 });
		await run.change({ spanHz: 2 });
		await vi.waitFor(() => expect(asked).toEqual([1, 2, 2]));
		expect([run.running, run.ended]).toEqual([true, undefined]);
		run.stop();
	});

	it('leaves the receiver to another page that has taken it', async () => {
		const asked: unknown[] = [];
		const run = runWith({
			sweeps: ({ settings }) => (asked.push(settings.spanHz), Promise.resolve(takenOver()))
		});
		run.running = true;
		await run.change({ spanHz: 2 });
		await vi.waitFor(() => expect(run.ended?.reason).toBe('taken-over'));
		expect([asked, run.running]).toEqual([[2], false]);
	});
});
