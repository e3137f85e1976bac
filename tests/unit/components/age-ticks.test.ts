import { describe, expect, it } from 'vitest';
import { ageTicks } from '$lib/components/bench/over-time/age-ticks';

const levelsDbm = new Float32Array();
const every = (stepS: number, count: number) =>
	Array.from({ length: count }, (_, row) => ({ row, clockS: row * stepS, levelsDbm }));

describe('ageTicks(rows, rowPx, heightPx)', () => {
	it('counts seconds back from the newest sweep at the top', () => {
		const ticks = ageTicks(every(0.02, 500), 2, 320);
		expect(ticks[0]).toEqual({ px: 0, figure: '0.0' });
		expect(ticks.map(({ figure }) => figure)).toEqual(['0.0', '0.5', '1.0', '1.5', '2.0', '2.5', '3.0']);
		expect(ticks.map(({ px }) => px)).toEqual([0, 50, 100, 150, 200, 250, 300]);
	});

	it('says hundredths where the whole picture is short', () => {
		const figures = ageTicks(every(0.002, 160), 2, 320).map(({ figure }) => figure);
		expect(figures.slice(0, 3)).toEqual(['0.00', '0.05', '0.10']);
	});

	it('leaves room between figures where time jumped', () => {
		const rows = [
			...every(0.02, 100),
			...every(0.02, 40).map((row) => ({ ...row, clockS: row.clockS + 60 }))
		];
		const ticks = ageTicks(rows, 2, 320);
		expect(new Set(ticks.map(({ figure }) => figure)).size).toBe(ticks.length);
		ticks.slice(1).forEach(({ px }, i) => expect(px - ticks[i].px).toBeGreaterThan(20));
	});

	it('says nothing of fewer than two sweeps', () => {
		expect(ageTicks(every(1, 1), 2, 320)).toEqual([]);
	});
});
