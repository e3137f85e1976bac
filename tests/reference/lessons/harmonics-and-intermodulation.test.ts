/** The numbers worked out in the lesson "Harmonics and intermodulation", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { takeReading } from '$lib/measure/take-reading';
import type { ReadingRequest } from '$lib/measure/reading-request';
import { partOf } from '$lib/schemas/part';
import type { Scene } from '$lib/schemas/scene';
import { shownTrace } from '$lib/server/bench/grading/shown-trace';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { truth } from '$lib/server/bench/truth/truth';
import { powerRatioToDb } from '$lib/units/decibel';

const harbour: Scene = {
	emitters: [{ kind: 'cw', frequencyHz: 157e6, levelDbm: -6 }],
	device: { shiDbm: 40, toiDbm: 13.5 }
};
const mast: Scene = {
	emitters: [
		{ kind: 'cw', frequencyHz: 450.4e6, levelDbm: 7 },
		{ kind: 'cw', frequencyHz: 450.8e6, levelDbm: 7 }
	],
	device: { toiDbm: 33.5, shiDbm: null },
	path: [{ frequencyHz: 450e6, lossDb: 7.8 }]
};
const tones = { kind: 'intercept' as const, lowerHz: 450.4e6, upperHz: 450.8e6 };

function shown(scene: Scene, attenuationDb: number, request: ReadingRequest): number {
	const settings =
		scene === harbour
			? { startHz: 140e6, stopHz: 490e6, rbwHz: 100e3, points: 8001, attenuationDb }
			: { centreHz: 450.6e6, spanHz: 2e6, rbwHz: 3e3, points: 2001, attenuationDb };
	const reading = takeReading(
		shownTrace({ scene, seed: 1 }, field, resolveSettings(settings, field)),
		request
	);
	if (!('value' in reading)) return NaN;
	const parts: unknown = 'parts' in reading ? reading.parts : undefined;
	return partOf(parts, { n: 2 }) ?? reading.value;
}
const harmonics = { kind: 'harmonics' as const, fundamentalHz: 157e6, count: 2 };

describe('the lesson on harmonics and intermodulation', () => {
	it('25 W may have harmonics 57 dB down, −13 dBm (Radio Regulations, Appendix 3, from memory: 43 + 10 log P)', () => {
		const allowedDbc = 43 + powerRatioToDb(25);
		expect(allowedDbc).toBeCloseTo(57, 0);
		expect(powerRatioToDb(25_000) - allowedDbc).toBeCloseTo(-13, 0);
	});

	it('the harbour transmitter’s second harmonic is at −46 dBc', () =>
		expect(Math.abs((partOf(truth(harbour, harmonics).parts, { n: 2 }) ?? 0) + 46)).toBeLessThan(0.2));

	it.each([
		[0, -41.5],
		[30, -45.7]
	])('behind %d dB it reads %d dBc', (attenuationDb, dbc) =>
		expect(Math.abs(shown(harbour, attenuationDb, harmonics) - dbc)).toBeLessThan(0.25)
	);

	it('the mixer’s own harmonic of −6 dBm stands 49.3 dB under it', () =>
		expect(-6 - (field.shiDbm as number)).toBeCloseTo(-49.3, 1));

	it('−44.0 and −46.0 dBc make 0.81 % together, 0.63 % the stronger alone', () => {
		expect(100 * Math.sqrt(10 ** -4.4 + 10 ** -4.6)).toBeCloseTo(0.81, 2);
		expect(100 * 10 ** (-44 / 20)).toBeCloseTo(0.63, 2);
		expect(100 * 10 ** -4.4).toBeCloseTo(0.004, 3);
	});

	it('53.0 dB between +7.0 dBm tones and their product put the intercept at 33.5 dBm (Pozar, §10.3)', () => {
		const product = truth(mast, { kind: 'marker', atHz: 451.2e6 }).value;
		expect(product).toBeCloseTo(-46.0, 0);
		expect(7 + (7 - -46) / 2).toBeCloseTo(33.5, 1);
	});

	it('behind 10 dB the mixer’s own products lie at −44.4 dBc, behind 35 dB at −94.4 dBc', () => {
		const own = (attenuationDb: number) => 2 * (7 - 7.8 - attenuationDb - (field.toiDbm as number));
		expect(own(10)).toBeCloseTo(-44.4, 1);
		expect(own(35)).toBeCloseTo(-94.4, 1);
		// in step, 41.4 dB down
		expect(20 * Math.log10(1 + 10 ** (-41.4 / 20))).toBeLessThan(0.1);
	});

	it('with 35 dB the intercept reads true, with 10 dB far too low', () => {
		expect(Math.abs(shown(mast, 35, tones) - 33.5)).toBeLessThan(0.3);
		expect(shown(mast, 10, tones)).toBeLessThan(29);
	});
});
