import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { TraceSet } from '$lib/components/bench/state/trace-set.svelte';
import { resolved } from './resolved-settings';

const piece = (row: number) => ({
	...{
		type: 'piece' as const,
		row,
		fromPoint: 0,
		points: 3,
		last: true,
		resent: false,
		clockS: row,
		speedUp: 1
	},
	levelsDbm: Float32Array.of(-90, -40 - row, -90)
});

beforeEach(() => vi.useFakeTimers({ toFake: ['performance'] }));
afterEach(() => vi.useRealTimers());

describe('TraceSet', () => {
	it('draws every row, and lets figures and words follow five times a second at most', () => {
		const traces = new TraceSet();
		traces.use(resolved);
		const rowsShown: [number | undefined, number | undefined][] = [];
		for (let row = 0; row < 5; row++) {
			traces.take(piece(row));
			traces.show();
			rowsShown.push([traces.lastRow, traces.readRow]);
			expect(traces.shown[0].drawnDbm[1]).toBe(-40 - row);
			vi.advanceTimersByTime(70);
		}
		expect(rowsShown).toEqual([
			[0, 0],
			[1, 0],
			[2, 0],
			[3, 3],
			[4, 3]
		]);
		expect(traces.read[0].levelsDbm[1]).toBe(-43);
		traces.settle();
		expect([traces.readRow, traces.readCount]).toEqual([4, 5]);
	});
});
