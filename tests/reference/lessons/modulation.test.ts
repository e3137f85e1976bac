/** The numbers worked out in the lesson "Amplitude and frequency modulation", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { besselOrders } from '$lib/measure/bessel';
import { gaussianConstant } from '$lib/server/bench/receiver/resolution-filter';
import { amLinesOf } from './am-lines-of';

describe('the lesson on amplitude and frequency modulation', () => {
	it('sidebands 11.5 dB down mean a depth of 53 %, one of them alone 27 %', () => {
		const depth = 2 * 10 ** (-11.5 / 20);
		expect(depth).toBeCloseTo(0.532, 3);
		expect(depth / 2).toBeCloseTo(0.27, 2);
		const [lower, carrier, upper] = amLinesOf(depth);
		expect(lower - carrier).toBeCloseTo(-11.5, 2);
		expect(upper - carrier).toBeCloseTo(-11.5, 2);
	});

	it('at 100 % the sidebands stand 6.0 dB down; at 53 % the crest stands 3.7 dB over the carrier', () => {
		const [lower, carrier] = amLinesOf(1);
		expect(lower - carrier).toBeCloseTo(-6.0, 1);
		expect(20 * Math.log10(1.532)).toBeCloseTo(3.7, 1);
	});

	it('of a 1 kHz tone 10 kHz leave 0.986, 1 kHz 0.250, the video filter 0.949: 52 % and 13 %', () => {
		const left = (rbwHz: number) => Math.exp(-gaussianConstant(rbwHz) * 1000 ** 2);
		const video = (rbwHz: number) => 1 / Math.hypot(1, 1000 / (3 * rbwHz));
		expect(left(10e3)).toBeCloseTo(0.986, 3);
		expect(left(1e3)).toBeCloseTo(0.25, 3);
		expect(video(1e3)).toBeCloseTo(0.95, 2);
		expect(53.2 * left(10e3) * video(10e3)).toBeCloseTo(52.4, 1);
		expect(53.2 * left(1e3) * video(1e3)).toBeCloseTo(12.6, 1);
	});

	it('at an index of 1.94 the small-index rule gives 4.5', () => {
		const [carrier, first] = besselOrders(1, 3400 / 1750);
		expect(3400 / 1750).toBeCloseTo(1.94, 2);
		expect((2 * first) / carrier).toBeCloseTo(4.5, 1);
	});

	it('Carson’s rule gives 10.3 kHz, which hold 97 % of the power (Carson’s rule: about 98 %, from memory)', () => {
		const widthHz = 2 * (3400 + 1750);
		expect(widthHz).toBe(10_300);
		const orders = besselOrders(20, 3400 / 1750);
		const within = orders.reduce(
			(sum, j, n) => sum + (n * 1750 <= widthHz / 2 ? (n === 0 ? 1 : 2) * j * j : 0),
			0
		);
		expect(within).toBeCloseTo(0.97, 2);
	});

	it.each([2.405, 5.52, 8.654])('J₀ is zero at %d (Abramowitz & Stegun, table 9.5)', (index) =>
		expect(besselOrders(0, index)[0]).toBeCloseTo(0, 3)
	);

	it('75 kHz are the first null at 31.19 kHz, the second at 13.59 kHz; taken for the first, 32.7 kHz', () => {
		expect(75 / 2.4048).toBeCloseTo(31.19, 2);
		expect(75 / 5.5201).toBeCloseTo(13.59, 2);
		expect(13.59 * 2.4048).toBeCloseTo(32.7, 1);
		expect(5.5201 / 2.4048).toBeCloseTo(2.3, 1);
	});

	it('at the first null the first pair is the strongest, at the second the fourth, the first 1.3 dB weaker', () => {
		const strongest = (index: number) => {
			const sizes = [...besselOrders(12, index)].map(Math.abs);
			return sizes.indexOf(Math.max(...sizes));
		};
		expect(strongest(2.4048)).toBe(1);
		expect(strongest(5.5201)).toBe(4);
		const orders = besselOrders(4, 5.5201);
		expect(20 * Math.log10(Math.abs(orders[4] / orders[1]))).toBeCloseTo(1.3, 1);
	});
});
