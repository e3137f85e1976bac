import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	advanceBench,
	firstUnfinishedRow,
	type BenchPosition
} from '$lib/server/services/attempts/advance-bench';
import { RowClock } from '$lib/server/services/attempts/row-clock';

const start: BenchPosition = { nextRow: 0, clockS: 0, rowEndS: 0 };
const everyRow = (durationS: number) => new RowClock(() => durationS, 0, 0);

describe('advanceBench(position, rows, sliceS, untilRow)', () => {
	it('begins short rows only to finish them', () => {
		const after = advanceBench(start, everyRow(0.0625), 0.15);
		expect(after).toEqual({ nextRow: 3, clockS: 0.1875, rowEndS: 0.1875 });
		expect(firstUnfinishedRow(after)).toBe(3);
	});

	it('lets a long row pass slice by slice', () => {
		const rows = everyRow(2);
		const first = advanceBench(start, rows, 0.15);
		expect(first).toEqual({ nextRow: 1, clockS: 0.15, rowEndS: 2 });
		expect(firstUnfinishedRow(first)).toBe(0);
		expect(advanceBench(first, rows, 0.15)).toEqual({ nextRow: 1, clockS: 0.3, rowEndS: 2 });
	});

	it('goes on to the next row in the slice that ends a long one', () => {
		const near: BenchPosition = { nextRow: 1, clockS: 1.9, rowEndS: 2 };
		expect(advanceBench(near, everyRow(2), 0.5)).toEqual({ nextRow: 2, clockS: 2.4, rowEndS: 4 });
	});

	it('begins no row from untilRow on, and finishes the one before it', () => {
		expect(advanceBench(start, everyRow(0.01), 1, 2)).toEqual({ nextRow: 2, clockS: 0.02, rowEndS: 0.02 });
		const near: BenchPosition = { nextRow: 1, clockS: 1.9, rowEndS: 2 };
		expect(advanceBench(near, everyRow(2), 0.5, 1)).toEqual({ nextRow: 1, clockS: 2, rowEndS: 2 });
	});

	it('always moves, never skips a row, and spends the time asked for but for rows it must finish', () => {
		const durations = fc.array(fc.double({ min: 0.011, max: 3, noNaN: true }), {
			minLength: 50,
			maxLength: 50
		});
		const slices = fc.array(fc.double({ min: 0.01, max: 0.4, noNaN: true }), { minLength: 1, maxLength: 40 });
		fc.assert(
			fc.property(durations, slices, (ofRow, each) => {
				const rows = new RowClock((row) => ofRow[row % 50], 0, 0);
				let position = start;
				for (const sliceS of each) {
					const next = advanceBench(position, rows, sliceS);
					expect(next.clockS).toBeGreaterThanOrEqual(position.clockS + sliceS - 1e-9);
					expect(next.clockS).toBeLessThan(position.clockS + 2 * sliceS + 1e-9);
					const row = firstUnfinishedRow(next);
					expect(next.clockS).toBeGreaterThanOrEqual(rows.startS(row));
					expect(next.clockS).toBeLessThan(rows.endS(row));
					position = next;
				}
			})
		);
	});
});

describe('RowClock', () => {
	it('gives the same times in whatever order it is asked', () => {
		const duration = (row: number) => 0.01 + (row % 7) * 0.003;
		const asked = new RowClock(duration, 5, 1.5);
		const late = asked.startS(400);
		expect(asked.startS(5)).toBe(1.5);
		expect(new RowClock(duration, 5, 1.5).endS(399)).toBe(late);
	});

	it('refuses rows before its first', () => {
		expect(() => new RowClock(() => 1, 5, 0).startS(4)).toThrow(RangeError);
	});
});
