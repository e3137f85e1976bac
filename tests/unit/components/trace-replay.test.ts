import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { TraceReplay } from '$lib/components/bench/over-time/trace-replay';
import { combineRows } from '$lib/measure/combine-rows';
import type { TraceMode } from '$lib/schemas/settings';
import { resolved as start } from './resolved-settings';

const modes: TraceMode[] = ['live', 'max-hold', 'min-hold', 'average'];
const row = fc.array(fc.double({ min: -120, max: 0, noNaN: true }), { minLength: 5, maxLength: 5 });

describe('TraceReplay', () => {
	it('shows the traces as they stood after any sweep, in whatever order sweeps are asked for', () => {
		fc.assert(
			fc.property(
				fc.array(row, { minLength: 1, maxLength: 12 }),
				fc.array(fc.nat(11), { minLength: 1, maxLength: 12 }),
				(levels, order) => {
					const rows = levels.map((values, n) => ({
						row: n,
						clockS: n,
						levelsDbm: Float32Array.from(values)
					}));
					const traces = modes.map((mode) => ({ mode, count: 3 }));
					const resolved = { ...start, traces, scale: 'power' as const };
					const replay = new TraceReplay({ resolved, rows, words: 'this set-up' });
					for (const index of order.map((n) => n % rows.length)) {
						const shown = rows.slice(0, index + 1).map(({ levelsDbm }) => levelsDbm);
						expect(replay.after(index)).toEqual(modes.map((mode) => combineRows(shown, mode, 3, 'power')));
					}
				}
			)
		);
	});

	it('leaves a kept trace empty', () => {
		const rows = [{ row: 0, clockS: 0, levelsDbm: new Float32Array(3) }];
		const resolved = { ...start, traces: [{ mode: 'kept' as const, count: 1 }] };
		expect(new TraceReplay({ resolved, rows, words: '' }).after(0)[0]).toHaveLength(0);
	});
});
