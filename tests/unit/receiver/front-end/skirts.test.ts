import { describe, expect, it } from 'vitest';
import { FilteredSkirt } from '$lib/server/bench/receiver/front-end/filtered-skirt';
import { SkirtField } from '$lib/server/bench/receiver/front-end/skirt-field';
import { densitySources, lineSource, wholeSources } from '$lib/server/bench/receiver/front-end/skirt-source';
import { phaseNoiseSkirt } from '$lib/server/bench/receiver/front-end/skirt-shape';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { field as fieldProfile } from '$lib/server/bench/receiver/profiles';

const db = (ratio: number) => 10 * Math.log10(ratio);
const shape = phaseNoiseSkirt(fieldProfile.phaseNoise!);
/** ∫L(|u|)·|H(offset − u)|² du by a fine midpoint rule: the definition. */
function filtered(offsetHz: number, rbwHz: number): number {
	const c = (4 * Math.LN2) / rbwHz ** 2;
	const step = rbwHz / 200;
	let sum = 0;
	for (let v = -4.5 * rbwHz; v < 4.5 * rbwHz; v += step)
		sum += shape.densityPerHz(Math.abs(offsetHz - v)) * Math.exp(-c * v * v) * step;
	return sum;
}

describe('FilteredSkirt.at(offsetHz)', () => {
	it.each([30, 1e3, 30e3])(
		'meets its definition to 0.02 dB from 3.5 B out to the last point (B = %d Hz)',
		(rbwHz) => {
			const skirt = new FilteredSkirt(shape, rbwHz);
			for (let offsetHz = 3.5 * rbwHz; offsetHz < 8e7; offsetHz *= 1.37)
				expect(Math.abs(db(skirt.at(offsetHz) / filtered(offsetHz, rbwHz))), `${offsetHz}`).toBeLessThan(
					0.02
				);
		}
	);
	it('is nothing beyond ten times the last offset', () =>
		expect(new FilteredSkirt(shape, 1e3).at(1.01e8)).toBe(0));
});

describe('phaseNoiseSkirt(points)', () => {
	it('leaves line and skirts together at the power of the carrier', () =>
		expect(shape.lineShare + 2 * shape.powerWithin(shape.endHz)).toBeCloseTo(1, 12));
	it('refuses a two-sided integral above 0.1 rad², by name', () =>
		expect(() => phaseNoiseSkirt([{ offsetHz: 1e3, dbcPerHz: -40 }], 'receiver.phaseNoise')).toThrow(
			/receiver\.phaseNoise.*0\.1/
		));
});

describe('SkirtField.at(frequencyHz)', () => {
	const skirt = new FilteredSkirt(shape, 1e3);
	const floorMw = 1e-14;
	const noiseBandwidthHz = 1064.467;
	const band = (startHz: number, stopHz: number) =>
		kindOf({ kind: 'noise' as const, densityDbmPerHz: -10 * Math.log10(stopHz - startHz), startHz, stopHz })
			.density!({ kind: 'noise', densityDbmPerHz: -10 * Math.log10(stopHz - startHz), startHz, stopHz });
	const fieldOf = (startHz: number, stopHz: number) =>
		SkirtField.of(
			skirt,
			densitySources(band(startHz, stopHz), 1, () => 1),
			floorMw
		)!;

	it('of a line is power from 3.5 B on, phase nearer', () => {
		const field = SkirtField.of(skirt, [lineSource(1e9, 0.5, 1e3)], floorMw)!;
		expect(field.at(1e9 + 3.49e3)).toBe(0);
		expect(field.at(1e9 - 3.51e3)).toBeCloseTo(0.5 * skirt.at(3.51e3), 15);
	});
	it('of a thousand lines is their sum within 0.05 dB', () => {
		const lines = Array.from({ length: 1000 }, (_, i) => ({
			frequencyHz: 1e9 + 5e3 * i,
			powerMw: 1e-3 * (1 + Math.sin(i))
		}));
		const field = SkirtField.of(
			skirt,
			lines.map((l) => lineSource(l.frequencyHz, l.powerMw, 1e3)),
			floorMw
		)!;
		for (let f = 0.99e9; f < 1.02e9; f += 71.3e3) {
			const sum = lines.reduce(
				(s, l) =>
					s + (Math.abs(f - l.frequencyHz) < 3.5e3 ? 0 : l.powerMw * skirt.at(Math.abs(f - l.frequencyHz))),
				0
			);
			expect(Math.abs(db(field.at(f) / sum)), `${f}`).toBeLessThan(0.05);
		}
	});
	it('of a band far narrower than the distance is that of a line of its power', () => {
		const field = fieldOf(1e9 - 500, 1e9 + 500);
		for (const offsetHz of [3e4, 2e5, 3e6])
			expect(Math.abs(db(field.at(1e9 + offsetHz) / skirt.at(offsetHz)))).toBeLessThan(0.05);
	});
	it('beside a flat band is the skirt integrated over the band', () => {
		const field = fieldOf(1e9 - 1e6, 1e9 + 1e6);
		for (const offsetHz of [5e3, 7e4, 1e6]) {
			const expected = (shape.powerWithin(offsetHz + 2e6) - shape.powerWithin(offsetHz)) / 2e6;
			expect(Math.abs(db(field.at(1e9 + 1e6 + offsetHz) / expected / noiseBandwidthHz))).toBeLessThan(0.05);
		}
	});
	it('of a band holds what the line share leaves over', () => {
		const field = fieldOf(1e9 - 1e6, 1e9 + 1e6);
		let total = 0;
		for (let offset = 500; offset < 9e7; offset *= 1.01)
			total += (2 * field.at(1e9 + offset) * 0.01 * offset) / noiseBandwidthHz;
		expect(total / (1 - shape.lineShare)).toBeCloseTo(1, 1);
	});
	it('of a signal followed as a whole is nothing while the filter is on it, and that of a line of its power far away', () => {
		const field = SkirtField.of(skirt, wholeSources(band(1e9 - 2e3, 1e9 + 2e3), 0.1, 1e3), floorMw)!;
		expect(field.at(1e9 + 3.2e3)).toBe(0);
		expect(field.at(1e9 + 3.3e3)).toBeGreaterThan(0);
		expect(Math.abs(db(field.at(1.0002e9) / (0.1 * skirt.at(2e5))))).toBeLessThan(0.02);
	});
	it('is not made for skirts that nothing shows of', () =>
		expect(SkirtField.of(skirt, [lineSource(1e9, 1e-14, 1e3)], floorMw)).toBeNull());
});
