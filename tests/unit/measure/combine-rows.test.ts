import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combineRows } from '$lib/measure/combine-rows';

const rows = [
	[-10, -20, -30],
	[-20, -20, -10],
	[-30, -26, -50]
];
const expectLevels = (levels: ArrayLike<number>, wanted: number[]) =>
	Array.from(levels).forEach((level, i) => expect(level).toBeCloseTo(wanted[i], 4));

describe('combineRows(rows, mode, count, scale)', () => {
	it('shows the last row when live or kept', () => {
		expectLevels(combineRows(rows, 'live', 1, 'log'), rows[2]);
		expectLevels(combineRows(rows, 'kept', 1, 'log'), rows[2]);
	});
	it('holds the highest and the lowest of all rows', () => {
		expectLevels(combineRows(rows, 'max-hold', 1, 'log'), [-10, -20, -10]);
		expectLevels(combineRows(rows, 'min-hold', 1, 'log'), [-30, -26, -50]);
	});
	it('averages dB on the log scale', () =>
		expectLevels(combineRows(rows, 'average', 3, 'log'), [-20, -22, -30]));
	it('averages milliwatts on the power scale', () =>
		expectLevels(combineRows(rows, 'average', 3, 'power'), [
			10 * Math.log10((0.1 + 0.01 + 0.001) / 3),
			10 * Math.log10((0.02 + 10 ** -2.6) / 3),
			10 * Math.log10((0.001 + 0.1 + 1e-5) / 3)
		]));
	it('averages root milliwatts on the voltage scale', () =>
		expectLevels(combineRows([[0], [-20]], 'average', 2, 'voltage'), [20 * Math.log10(0.55)]));
	it('averages no more than the last `count` rows, and what there is when there are fewer', () => {
		expectLevels(combineRows(rows, 'average', 2, 'log'), [-25, -23, -30]);
		expectLevels(combineRows(rows, 'average', 10, 'log'), [-20, -22, -30]);
	});
	it('refuses to make a trace of nothing', () =>
		expect(() => combineRows([], 'live', 1, 'log')).toThrow(RangeError));
	it('orders the scales: log at or under voltage at or under power, all between the extremes', () =>
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: -150, max: 30, noNaN: true }), { minLength: 1, maxLength: 30 }),
				(levels) => {
					const column = levels.map((level) => [level]);
					const of = (mode: 'average' | 'max-hold' | 'min-hold', scale: 'log' | 'voltage' | 'power') =>
						combineRows(column, mode, levels.length, scale)[0];
					const slack = 1e-4;
					expect(of('min-hold', 'log')).toBeLessThanOrEqual(of('average', 'log') + slack);
					expect(of('average', 'log')).toBeLessThanOrEqual(of('average', 'voltage') + slack);
					expect(of('average', 'voltage')).toBeLessThanOrEqual(of('average', 'power') + slack);
					expect(of('average', 'power')).toBeLessThanOrEqual(of('max-hold', 'log') + slack);
				}
			)
		));
});
