/** The numbers worked out in the lesson "Adjacent channels", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { takeReading } from '$lib/measure/take-reading';
import type { Scene } from '$lib/schemas/scene';
import { shownTrace } from '$lib/server/bench/grading/shown-trace';
import { floorDensity } from '$lib/server/bench/receiver/front-end/floor';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { phaseNoiseAt } from '$lib/server/bench/signal/phase-noise';
import { truth } from '$lib/server/bench/truth/truth';
import { dbToPowerRatio, milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';

const hop: Scene = {
	emitters: [
		{ kind: 'digital', frequencyHz: 7.4e9, levelDbm: 3, symbolRateHz: 22e6, rollOff: 0.2, order: 64 }
	],
	device: { toiDbm: 20, shiDbm: null }
};
const besideIt = {
	kind: 'adjacent-channel' as const,
	centreHz: 7.4e9,
	widthHz: 28e6,
	offsets: [{ offsetHz: 28e6, widthHz: 28e6 }]
};

/** What the field receiver shows on average behind an attenuation, dBc. */
function ratioBehind(attenuationDb: number): number {
	const settings = { centreHz: 7.4e9, spanHz: 90e6, rbwHz: 300e3, points: 601, attenuationDb };
	const reading = takeReading(
		shownTrace({ scene: hop, seed: 1 }, field, resolveSettings(settings, field)),
		besideIt
	);
	return 'value' in reading ? reading.value : NaN;
}
const toiDbm = field.toiDbm as number;
const noiseDbmPerHz = milliwattsToDbm(floorDensity(field, { attenuationDb: 0, preamp: false })(7.4e9));
const noiseDbm = noiseDbmPerHz + powerRatioToDb(28e6);

describe('the lesson on adjacent channels', () => {
	it('the field receiver’s noise at 7.4 GHz is −147.4 dBm/Hz, in 28 MHz −73.0 dBm', () => {
		expect(noiseDbmPerHz).toBeCloseTo(-147.4, 1);
		expect(noiseDbm).toBeCloseTo(-73.0, 1);
	});

	it('the best level at the mixer is −16.7 dBm, where products and noise are both 56.2 dB below', () => {
		const bestDbm = (2 * toiDbm + noiseDbm) / 3;
		expect(bestDbm).toBeCloseTo(-16.7, 1);
		expect(2 * (bestDbm - toiDbm)).toBeCloseTo(-56.2, 1);
		expect(noiseDbm - bestDbm).toBeCloseTo(-56.2, 1);
	});

	it.each([
		[5, -36.1],
		[15, -43.6],
		[20, -43.6],
		[40, -35.1]
	])('behind %d dB the hop reads %d dBc on average', (attenuationDb, dbc) =>
		expect(ratioBehind(attenuationDb)).toBeCloseTo(dbc, 1)
	);

	it('its true ratio is −44.0 dBc', () => expect(truth(hop, besideIt).value).toBeCloseTo(-44.0, 1));

	it.each([
		[10, 0.4, 1],
		[0, 3.0, 1],
		[20, 0.04, 2]
	])('a share of the receiver’s own %d dB below adds %d dB', (belowDb, addedDb, digits) =>
		expect(powerRatioToDb(1 + dbToPowerRatio(-belowDb))).toBeCloseTo(addedDb, digits)
	);

	it('phase noise of −100 dBc/Hz at 25 kHz is −58 dBc in 16 kHz', () => {
		const dbcPerHz = powerRatioToDb(phaseNoiseAt(field.phaseNoise!, 25e3));
		expect(dbcPerHz).toBeCloseTo(-100, 0);
		expect(dbcPerHz + powerRatioToDb(16e3)).toBeCloseTo(-58, 0);
	});
});
