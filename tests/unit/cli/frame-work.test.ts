import { describe, expect, it } from 'vitest';
import { workPerFrame } from '../../../src/cli/page-speed/frame-work';
import { quantile } from '../../../src/cli/page-speed/quantile';

const main = { pid: 1, tid: 7 };
const frame = (ts: number, at = main) => ({ name: 'BeginMainThreadFrame', ts, ...at });
const task = (ts: number, dur: number, tdur?: number, at = main) => ({
	name: 'RunTask',
	ts,
	dur,
	tdur,
	...at
});
const named = (at: typeof main) => ({ name: 'thread_name', ts: 0, args: { name: 'CrRendererMain' }, ...at });

describe('workPerFrame(events)', () => {
	it('adds up the tasks of the page’s main thread from one frame to the next', () => {
		const events = [
			named(main),
			frame(0),
			task(100, 2000, 1500),
			task(4000, 1000, 500),
			frame(16_000),
			task(16_500, 3000),
			frame(33_000),
			// The last frame has no end, and another thread is no matter.
			task(34_000, 9000),
			task(200, 8000, 8000, { pid: 1, tid: 9 })
		];
		expect(workPerFrame(events)).toEqual({ processorMs: [2, 3], wallMs: [3, 3] });
	});
	it('takes the thread with most frames where several pages draw', () => {
		const other = { pid: 2, tid: 7 };
		const events = [named(main), named(other), frame(0, other), frame(0), task(1, 1000), frame(16_000)];
		expect(workPerFrame(events).wallMs).toEqual([1]);
	});
});

describe('quantile(values, share)', () => {
	it('is the value that so many don’t exceed', () => {
		expect([0, 0.5, 0.95].map((share) => quantile([5, 1, 4, 2, 3], share))).toEqual([1, 3, 5]);
	});
});
