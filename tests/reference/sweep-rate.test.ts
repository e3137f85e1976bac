/**
 * D. Sweep rate: loss and broadening of a Gaussian filter swept linearly.
 * Source: W. W. Peterson, Tech. Rep. 38, Electronic Defense Group, Univ. of Michigan, 1955 (abstract and figure list read);
 * values computed from the Gaussian integral: q = (2 ln 2/π)·r, factor (1+q²)^(−1/4), width √(1+q²).
 */
import { describe, expect, it } from 'vitest';
import { sweep } from './bench-on-paper';

const table: [r: number, lossDb: number, widthPerRbw: number][] = [
	[0.1, 0.0042, 1.00097],
	[0.2, 0.0168, 1.00389],
	[1 / 3, 0.0465, 1.01076],
	[0.4, 0.0666, 1.01546],
	[0.5, 0.1032, 1.02405],
	[1, 0.3863, 1.09303],
	[2, 1.2507, 1.33375],
	[2.26618, 1.5051, 1.41421],
	[5, 3.8425, 2.4224],
	[10, 6.5558, 4.5246]
];
const rbwHz = 10e3;
const spanHz = 200e3;

describe('a line swept at r = S/(T·B²)', () => {
	it.each(table)('r = %d reads %d dB low and %d B wide', (r, lossDb, widthPerRbw) => {
		const settings = {
			centreHz: 1e9,
			spanHz,
			rbwHz,
			vbwHz: 10e6,
			sweepTimeS: spanHz / (r * rbwHz * rbwHz),
			points: 8001,
			detector: 'positive-peak' as const,
			scale: 'power' as const
		};
		const { levelsDbm } = sweep({ emitters: [{ kind: 'cw', frequencyHz: 1e9, levelDbm: -20 }], settings });
		const row = levelsDbm[0];
		const top = Math.max(...row);
		expect(-20 - top).toBeCloseTo(lossDb, 1.7); // T1: 0.02 dB
		const above = row.map((l, i) => ({ l, i })).filter(({ l }) => l >= top - 3.0103);
		const width = ((above[above.length - 1].i - above[0].i) * spanHz) / 8000;
		// peak detection widens by up to two half buckets of 25 Hz
		expect(Math.abs(width / rbwHz - widthPerRbw)).toBeLessThan(0.005 * widthPerRbw + 0.005);
	});

	it('has no frequency shift: a Gaussian filter without delay peaks where the line is', () => {
		const settings = {
			centreHz: 1e9,
			spanHz,
			rbwHz,
			vbwHz: 10e6,
			sweepTimeS: 0.002,
			points: 8001,
			detector: 'sample' as const
		};
		const row = sweep({ emitters: [{ kind: 'cw', frequencyHz: 1e9, levelDbm: -20 }], settings }).levelsDbm[0];
		expect(row.indexOf(Math.max(...row))).toBeCloseTo(4000, -1);
	});
});
