import { describe, expect, it } from 'vitest';
import { densitySkirt } from '$lib/server/bench/receiver/front-end/density-skirt';
import { FilteredSkirt } from '$lib/server/bench/receiver/front-end/filtered-skirt';
import { skirtPower } from '$lib/server/bench/receiver/front-end/line-skirts';
import { phaseNoiseSkirt } from '$lib/server/bench/receiver/front-end/skirt-shape';
import { field } from '$lib/server/bench/receiver/profiles';

const db = (ratio: number) => 10 * Math.log10(ratio);
const shape = phaseNoiseSkirt(field.phaseNoise!);
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

describe('skirtPower(lines, rbwHz, floorMw)', () => {
	const skirt = new FilteredSkirt(shape, 1e3);
	const at = skirtPower([{ frequencyHz: 1e9, powerMw: 0.5, skirt }], 1e3, 1e-14)!;
	it('is power from 3.5 B on, phase nearer', () => {
		expect(at(1e9 + 3.49e3)).toBe(0);
		expect(at(1e9 - 3.51e3)).toBeCloseTo(0.5 * skirt.at(3.51e3), 15);
	});
});

describe('densitySkirt(source, shape, finestHz)', () => {
	const band = (startHz: number, stopHz: number) => ({
		startHz,
		stopHz,
		breaksHz: [startHz, stopHz],
		powerMw: (a: number, b: number) =>
			Math.max(0, Math.min(b, stopHz) - Math.max(a, startHz)) / (stopHz - startHz)
	});
	it('of a band far narrower than the distance is the skirt of a line of its power', () => {
		const spread = densitySkirt(band(1e9 - 500, 1e9 + 500), shape, 100);
		for (const offsetHz of [3e4, 2e5, 3e6])
			expect(
				Math.abs(db(spread.powerMw(1e9 + offsetHz, 1e9 + offsetHz + 1) / shape.densityPerHz(offsetHz)))
			).toBeLessThan(0.05);
	});
	it('beside a flat band is the skirt integrated over the band', () => {
		const spread = densitySkirt(band(1e9 - 1e6, 1e9 + 1e6), shape, 100);
		for (const offsetHz of [300, 5e3, 7e4, 1e6]) {
			const expected = (shape.powerWithin(offsetHz + 2e6) - shape.powerWithin(offsetHz)) / 2e6;
			expect(
				Math.abs(db(spread.powerMw(1e9 + 1e6 + offsetHz - 0.5, 1e9 + 1e6 + offsetHz + 0.5) / expected))
			).toBeLessThan(0.05);
		}
	});
	it('holds what the line share leaves over', () => {
		const spread = densitySkirt(band(1e9 - 1e6, 1e9 + 1e6), shape, 100);
		let total = 0;
		for (let offset = 5; offset < 3e7; offset *= 1.02)
			total += 2 * spread.powerMw(1e9 + offset, 1e9 + offset * 1.02);
		expect(total / (1 - shape.lineShare)).toBeCloseTo(1, 1);
	});
});
