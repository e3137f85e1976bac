import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { frequencyAxis, niceStep } from '$lib/components/bench/plot/frequency-axis';

const figures = (start: number, stop: number, left = 44, right = 1000) =>
	frequencyAxis({ start, stop }, left, right).ticks.flatMap(({ figure }) => figure ?? []);

describe('niceStep(least)', () => {
	it('is the next of 1, 2, 5', () =>
		expect([0.9, 1, 1.1, 2.1, 5.1].map((n) => niceStep(n).step)).toEqual([1, 1, 2, 5, 10]));
});

describe('frequencyAxis(range, leftPx, rightPx)', () => {
	it('writes true frequencies in one unit with the decimals its step needs', () => {
		const axis = frequencyAxis({ start: 449.975e6, stop: 450.075e6 }, 44, 1000);
		expect(axis.unit).toBe('MHz');
		expect(axis.ticks.flatMap(({ figure }) => figure ?? [])).toEqual([
			'449.98',
			'450.00',
			'450.02',
			'450.04',
			'450.06'
		]);
	});

	it('drops every other figure when they would touch, and keeps every long tick', () => {
		const axis = frequencyAxis({ start: 1_000_000_000, stop: 1_000_000_100 }, 0, 330);
		const long = axis.ticks.filter((tick) => tick.long);
		const written = long.filter((tick) => tick.figure);
		expect(written.length).toBeLessThan(long.length);
		expect(written.length).toBeGreaterThan(0);
	});

	it('counts level over time in seconds', () =>
		expect(frequencyAxis({ start: 0, stop: 0.02, kind: 'time' }, 0, 900).unit).toBe('ms'));

	it('leaves a window without width empty', () =>
		expect(frequencyAxis({ start: 5e6, stop: 5e6 }, 0, 900).ticks).toEqual([]));

	it('never lets figures touch, leave the drawing or stand where the unit does, whatever the window', () =>
		fc.assert(
			fc.property(
				fc.double({ min: 0, max: 8e9, noNaN: true }),
				fc.double({ min: 10, max: 8e9, noNaN: true }),
				fc.integer({ min: 240, max: 1600 }),
				(start, span, width) => {
					const axis = frequencyAxis({ start, stop: start + span }, 36, width);
					const written = axis.ticks.filter((tick) => tick.figure !== undefined);
					const half = (text = '') => (text.length * 7.3) / 2;
					for (const [i, tick] of written.entries()) {
						if (i > 0) {
							const gap = tick.px - half(tick.figure) - (written[i - 1].px + half(written[i - 1].figure));
							expect(gap).toBeGreaterThanOrEqual(0);
						}
						expect(tick.px + half(tick.figure)).toBeLessThanOrEqual(width - axis.unit.length * 7.3);
					}
					expect(axis.ticks.every((tick) => tick.px >= 35.9 && tick.px <= width + 0.1)).toBe(true);
				}
			)
		));

	it('has a figure on the usual spans', () => {
		for (const span of [100, 1e3, 25e3, 1e5, 2e6, 2e7, 1e9])
			expect(figures(450e6 - span / 2, 450e6 + span / 2).length).toBeGreaterThan(1);
	});
});
