import { describe, expect, it } from 'vitest';
import { CUT_RBW, GaussianFir } from '$lib/server/bench/receiver/gaussian-fir';
import { Random } from '$lib/server/bench/receiver/random';
import { gaussianConstant } from '$lib/server/bench/receiver/resolution-filter';

/** What the filter's definition says, sample by sample. */
function defined(rbwHz: number, stepS: number, x: Float64Array, centre: number): number {
	const c = gaussianConstant(rbwHz);
	const half = Math.ceil(CUT_RBW / rbwHz / stepS);
	let sum = 0;
	let weights = 0;
	for (let j = -half; j <= half; j++) {
		const tap = Math.exp(-((Math.PI * j * stepS) ** 2) / c);
		sum += tap * x[centre - j];
		weights += tap;
	}
	return sum / weights;
}

describe('GaussianFir', () => {
	it.each([
		['short', 1e-2, 3, 40],
		['long', 1e-3, 1, 900],
		['longer than what it filters', 2e-4, 2, 300]
	])('of a %s filter is its definition, from the first sample to the last', (_, stepPerRbw, fine, points) => {
		const rbwHz = 10e3;
		const stepS = stepPerRbw / rbwHz;
		const fir = new GaussianFir(rbwHz, gaussianConstant(rbwHz), stepS, fine);
		const count = (points - 1) * fine + 1 + 2 * fir.half;
		const random = new Random(5, 0, 'fir');
		const x = Float64Array.from({ length: count + 7 }, () => random.normal());
		const y = x.map(() => random.normal());
		const re = new Float64Array(points + 3).fill(1);
		const im = new Float64Array(points + 3);
		fir.addTo(2, points + 2, x, y, 0.6, -0.8, re, im);
		for (let i = 0; i < points; i++) {
			const sx = defined(rbwHz, stepS, x, fir.half + i * fine);
			const sy = defined(rbwHz, stepS, y, fir.half + i * fine);
			expect(Math.abs(re[i + 2] - (1 + 0.6 * sx + 0.8 * sy))).toBeLessThan(1e-13);
			expect(Math.abs(im[i + 2] - (0.6 * sy - 0.8 * sx))).toBeLessThan(1e-13);
		}
		expect([re[0], re[1], re[points + 2]]).toEqual([1, 1, 1]);
	});
});
