import seedrandom from 'seedrandom';
import { describe, expect, it } from 'vitest';
import { hash128 } from '$lib/server/bench/receiver/hash128';
import { Random } from '$lib/server/bench/receiver/random';

const N = 100_000;
const draw = (make: (r: Random) => number, seed: number | string = 7): Float64Array => {
	const random = new Random(seed, 0, 'test');
	return Float64Array.from({ length: N }, () => make(random));
};
const moments = (values: Float64Array) => {
	const mean = values.reduce((a, b) => a + b, 0) / N;
	const central = (k: number) => values.reduce((a, b) => a + (b - mean) ** k, 0) / N;
	const variance = central(2);
	let lag = 0;
	for (let i = 1; i < N; i++) lag += (values[i] - mean) * (values[i - 1] - mean);
	return {
		mean,
		variance,
		skew: central(3) / variance ** 1.5,
		kurtosis: central(4) / variance ** 2 - 3,
		lag1: lag / N / variance
	};
};
/** Kolmogorov–Smirnov distance of the first 10 000 draws; 1 % point for n = 10 000 is 0.016259 (scipy kstwo, computed). */
const kolmogorov = (values: Float64Array, cdf: (x: number) => number): number => {
	const sorted = values.slice(0, 10_000).sort();
	return sorted.reduce(
		(d, x, i) => Math.max(d, Math.abs(cdf(x) - i / 1e4), Math.abs(cdf(x) - (i + 1) / 1e4)),
		0
	);
};

describe('Random', () => {
	it('is the xor128 that the seedrandom package runs, from the same state', () => {
		const random = new Random(1, 2, 'x');
		const [x, y, z, w] = hash128('1|n1|2|x');
		const reference = seedrandom.xor128('', { state: { x, y, z, w } as never });
		for (let i = 0; i < 1000; i++) expect(random.next()).toBe(reference.int32());
	});

	it('gives byte-equal draws for the same key and unrelated draws for neighbours', () => {
		const a = draw((r) => r.normal(), 7);
		expect(draw((r) => r.normal(), 7)).toEqual(a);
		const neighbours = [draw((r) => r.normal(), 8), draw((r) => r.normal(), '7')];
		for (const b of neighbours) {
			const correlation = a.reduce((sum, v, i) => sum + v * b[i], 0) / N;
			expect(Math.abs(correlation)).toBeLessThan(4 / Math.sqrt(N)); // checks N7
		}
	});

	it('draws normals with the moments of the normal law within four standard deviations (N4)', () => {
		const m = moments(draw((r) => r.normal()));
		expect(Math.abs(m.mean)).toBeLessThan(4 * 0.003162);
		expect(Math.abs(m.variance - 1)).toBeLessThan(4 * 0.004472);
		expect(Math.abs(m.skew)).toBeLessThan(4 * 0.007746);
		expect(Math.abs(m.kurtosis)).toBeLessThan(4 * 0.015492);
		expect(Math.abs(m.lag1)).toBeLessThan(4 * 0.003162);
	});

	it('fills a block with the same normals one by one would give', () => {
		const block = new Float64Array(5000);
		new Random(3, 1, 'fill').fillNormals(block, 5000);
		const one = new Random(3, 1, 'fill');
		expect(block).toEqual(Float64Array.from({ length: 5000 }, () => one.normal()));
	});

	it('draws uniforms with mean 1/2 and variance 1/12 (N4)', () => {
		const m = moments(draw((r) => r.uniform()));
		expect(Math.abs(m.mean - 0.5)).toBeLessThan(4 / Math.sqrt(12 * N));
		expect(Math.abs(m.variance - 1 / 12)).toBeLessThan(4 / Math.sqrt(180 * N));
	});

	it('passes Kolmogorov–Smirnov at 1 % for power, phase and both parts of complex noise (N5)', () => {
		const re = draw((r) => r.normal(), 'I');
		const im = draw((r) => r.normal(), 'Q');
		const power = re.map((x, i) => (x * x + im[i] * im[i]) / 2);
		const phase = re.map((x, i) => Math.atan2(im[i], x) / (2 * Math.PI) + 0.5);
		expect(kolmogorov(power, (x) => 1 - Math.exp(-x))).toBeLessThan(0.016259);
		expect(kolmogorov(phase, (x) => x)).toBeLessThan(0.016259);
		expect(
			kolmogorov(
				draw((r) => r.exponential()),
				(x) => 1 - Math.exp(-x)
			)
		).toBeLessThan(0.016259);
	});

	it('spreads uniforms over 256 bins: chi-square between the 0.1 % and 99.9 % points (N6)', () => {
		const bins = new Float64Array(256);
		for (const u of draw((r) => r.uniform())) bins[Math.floor(u * 256)]++;
		const chi2 = bins.reduce((sum, n) => sum + (n - N / 256) ** 2 / (N / 256), 0);
		expect(chi2).toBeGreaterThan(190.867);
		expect(chi2).toBeLessThan(330.52);
	});

	it.each([0.4, 1, 3.7, 60])('draws gammas of shape %d with that mean and variance', (a) => {
		const m = moments(draw((r) => r.gamma(a)));
		expect(Math.abs(m.mean - a)).toBeLessThan(4 * Math.sqrt(a / N));
		expect(Math.abs(m.variance / a - 1)).toBeLessThan(4 * Math.sqrt((2 + 6 / a) / N));
	});
});
