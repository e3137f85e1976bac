import seedrandom from 'seedrandom';
import { describe, expect, it } from 'vitest';
import { raisedCosine } from '$lib/server/bench/signal/raised-cosine';
import { constellation, mskPhase, rrcPulse } from '$lib/server/bench/signal/waveform';
import { waveformKurtosis } from '$lib/server/bench/signal/waveform-moments';

describe('rrcPulse(rollOff)', () => {
	const { perSymbol, halfSymbols, taps } = rrcPulse(0.22);
	const middle = perSymbol * halfSymbols;

	it('is 256 samples a symbol over ±16 symbols, even, and ends in zero', () => {
		expect([perSymbol, halfSymbols, taps.length]).toEqual([256, 16, 8193]);
		expect(taps[0]).toBeCloseTo(0, 12);
		for (let n = 1; n <= middle; n++) expect(taps[middle + n]).toBeCloseTo(taps[middle - n], 12);
	});
	it('gives unit-power symbols a mean power of 1', () =>
		expect(taps.reduce((sum, tap) => sum + tap * tap, 0) / perSymbol).toBeCloseTo(1, 12));
	it('through its own matched filter leaves neighbouring symbols alone: −50 dB', () => {
		for (const symbols of [1, 2, 5]) {
			let sum = 0;
			for (let i = 0; i + symbols * perSymbol < taps.length; i++)
				sum += taps[i] * taps[i + symbols * perSymbol];
			expect(Math.abs(sum / perSymbol)).toBeLessThan(3e-3);
		}
	});
	it('has the square root of the raised-cosine spectrum, without a hole where its formula divides by zero', () => {
		for (const rollOff of [0.22, 0.25, 0.5, 1]) {
			const pulse = rrcPulse(rollOff).taps;
			for (const f of [0, 0.3, 0.5]) {
				let sum = 0;
				pulse.forEach((tap, i) => {
					sum += (tap * Math.cos((2 * Math.PI * f * (i - middle)) / perSymbol)) / perSymbol;
				});
				expect(sum).toBeCloseTo(Math.sqrt(raisedCosine(f, rollOff)), 2);
			}
		}
	});
});

describe('mskPhase(bt?)', () => {
	it('without a filter turns evenly by π/2 over one bit', () => {
		const { perBit, halfBits, q } = mskPhase();
		expect([perBit, halfBits, q.length]).toEqual([256, 0.5, 257]);
		q.forEach((phase, i) => expect(phase).toBeCloseTo((Math.PI / 2) * (i / 256), 12));
	});
	it.each([0.1, 0.3, 0.5, 3])(
		'behind BT = %f rises from 0 to π/2, point-symmetric about the bit’s middle',
		(bt) => {
			const { halfBits, perBit, q } = mskPhase(bt);
			expect(q.length).toBe(2 * halfBits * perBit + 1);
			expect([q[0], q[q.length - 1]]).toEqual([0, expect.closeTo(Math.PI / 2, 12)]);
			q.forEach((phase, i) => {
				expect(phase + q[q.length - 1 - i]).toBeCloseTo(Math.PI / 2, 9);
				if (i > 0) expect(phase).toBeGreaterThanOrEqual(q[i - 1] - 1e-12);
			});
		}
	);
});

describe('constellation(order)', () => {
	it.each([2, 4, 16, 64, 256] as const)(
		'of order %i has that many different points of unit mean power',
		(order) => {
			const { re, im } = constellation(order);
			const points = new Set(Array.from(re, (value, i) => `${value} ${im[i]}`));
			expect(points.size).toBe(order);
			const power = re.reduce((sum, value, i) => sum + value ** 2 + im[i] ** 2, 0) / order;
			expect(power).toBeCloseTo(1, 12);
		}
	);
});

describe('waveformKurtosis(order, rollOff)', () => {
	it('is what a long random waveform shows', () => {
		const { re, im } = constellation(16);
		const { taps, perSymbol, halfSymbols } = rrcPulse(0.5);
		const draw = seedrandom('symbols');
		const symbols = Array.from({ length: 8192 }, () => Math.floor(16 * draw()));
		let second = 0;
		let fourth = 0;
		for (let n = 40 * 4; n < (symbols.length - 40) * 4; n++) {
			let [x, y] = [0, 0];
			const centre = Math.floor(n / 4);
			for (let k = centre - halfSymbols + 1; k < centre + halfSymbols; k++) {
				const tap = taps[(n / 4 - k) * perSymbol + halfSymbols * perSymbol];
				x += re[symbols[k]] * tap;
				y += im[symbols[k]] * tap;
			}
			second += x * x + y * y;
			fourth += (x * x + y * y) ** 2;
		}
		const count = (symbols.length - 80) * 4;
		const measured = fourth / count / (second / count) ** 2;
		expect(Math.abs(measured - waveformKurtosis(16, 0.5))).toBeLessThan(0.03);
	});
	it('rises with the order and lies between a constant envelope and noise', () => {
		const values = ([4, 16, 64, 256] as const).map((order) => waveformKurtosis(order, 0.22));
		expect([...values].sort((a, b) => a - b)).toEqual(values);
		expect(values[0]).toBeGreaterThan(1);
		expect(values[3]).toBeLessThan(2);
	});
});
