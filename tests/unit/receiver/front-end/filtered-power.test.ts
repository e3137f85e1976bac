import { describe, expect, it } from 'vitest';
import { FilteredPower, type SpectrumPart } from '$lib/server/bench/receiver/front-end/filtered-power';

/** Complementary error function by its continued fraction and series, to 1e-12: independent of the code under test. */
function erfc(x: number): number {
	if (x < 0) return 2 - erfc(-x);
	if (x < 2) {
		let term = x;
		let sum = x;
		for (let n = 1; n < 60; n++) {
			term *= (-x * x) / n;
			sum += term / (2 * n + 1);
		}
		return 1 - (2 / Math.sqrt(Math.PI)) * sum;
	}
	let fraction = 0;
	for (let n = 60; n > 0; n--) fraction = n / 2 / (x + fraction);
	return Math.exp(-x * x) / Math.sqrt(Math.PI) / (x + fraction);
}
const B = 1e3;
const TWO_C = (4 * Math.LN2) / (B * B);
const band = (startHz: number, stopHz: number, density: number): SpectrumPart => ({
	startHz,
	stopHz,
	breaksHz: [startHz, stopHz],
	powerMw: (a, b) => density * Math.max(0, Math.min(b, stopHz) - Math.max(a, startHz))
});
/** ∫ over the band of exp(−2c·u²): the definition, for a flat band. */
function flatBand(startHz: number, stopHz: number, density: number, tunedHz: number): number {
	const root = Math.sqrt(TWO_C);
	const [a, b] = [startHz - tunedHz, stopHz - tunedHz].map((x) => x * root);
	const area = a > 0 ? erfc(a) - erfc(b) : erfc(-b) - erfc(-a);
	return (density * (Math.sqrt(Math.PI) / 2) * area) / root;
}
const db = (ratio: number) => 10 * Math.log10(ratio);

describe('FilteredPower.at(frequencyHz)', () => {
	it.each([0, 40e3])(
		'meets the error function of a flat band to 0.01 dB, 100 dB down its skirt (points %d Hz apart)',
		(spacing) => {
			const power = new FilteredPower([band(1e9 - 20.3e3, 1e9 + 31.17e3, 1e-6)], B, 1e-16, 0.99e9, spacing);
			for (let f = 1e9 - 24e3; f < 1e9 + 35e3; f += 37.7) {
				const expected = flatBand(1e9 - 20.3e3, 1e9 + 31.17e3, 1e-6, f);
				if (expected < 1e-13) continue;
				expect(Math.abs(db(power.at(f) / expected)), `${f}`).toBeLessThan(0.01);
			}
		}
	);
	it('meets it for a band narrower than the filter', () => {
		const power = new FilteredPower([band(5e6 - 110, 5e6 + 90, 1e-4)], B, 1e-14, 4.9e6, 100);
		for (let f = 5e6 - 2.5e3; f < 5e6 + 2.5e3; f += 33.3)
			expect(Math.abs(db(power.at(f) / flatBand(5e6 - 110, 5e6 + 90, 1e-4, f))), `${f}`).toBeLessThan(0.01);
	});
	it('is 1.0644670 B times the density inside a wide band', () => {
		const power = new FilteredPower([band(0, 1e8, 2e-9)], B, 1e-16, 0, 0);
		expect(power.at(5e7) / 2e-9 / B).toBeCloseTo(1.064467, 6);
	});
	it('is 0 where no density reaches, whatever the width asked about', () => {
		const power = new FilteredPower([band(1e9, 1.1e9, 1)], 1, 1e-16, 0, 8e6);
		expect(power.at(0.5e9)).toBe(0);
		expect(power.at(8e9)).toBe(0);
	});
	it('adds parts as powers', () => {
		const a = band(1e6, 1.02e6, 1e-8);
		const b = band(1.01e6, 1.05e6, 3e-8);
		const alone = (part: SpectrumPart) => new FilteredPower([part], B, 1e-17, 0.9e6, 10).at(1.0133e6);
		const both = new FilteredPower([a, b], B, 1e-17, 0.9e6, 10).at(1.0133e6);
		expect(both / (alone(a) + alone(b))).toBeCloseTo(1, 4);
	});
});
