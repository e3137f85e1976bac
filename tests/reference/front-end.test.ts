/** Published and computed values of noise, intermodulation and phase noise, met by what reaches the resolution filter. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { receiverProfile, type ReceiverProfile } from '$lib/schemas/receiver';
import { scene as sceneSchema, type Scene } from '$lib/schemas/scene';
import { settings as settingsSchema, type ResolvedSettings, type Settings } from '$lib/schemas/settings';
import { cascadeNoiseFactor, floorDensity, lossStage } from '$lib/server/bench/receiver/front-end/floor';
import { COMPRESSION_UNDER_TOI_DB } from '$lib/server/bench/receiver/front-end/input-level';
import { prepareIncident } from '$lib/server/bench/receiver/front-end/prepare-incident';
import type { Incident } from '$lib/server/bench/receiver/incident';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { ideal as plain } from './bench-on-paper';

const dbm = (milliwatts: number) => 10 * Math.log10(milliwatts);
const ratio = (db: number) => 10 ** (db / 10);
const stage = (gainDb: number, noiseFigureDb: number) => ({
	gain: ratio(gainDb),
	noiseFactor: ratio(noiseFigureDb)
});
const ideal: ReceiverProfile = {
	...plain,
	noiseFigureDb: [{ frequencyHz: 1e9, db: 24 }],
	rbwHz: [100, 1e3, 1e4, 3e4]
};
const incidentOf = (scene: Scene, profile: ReceiverProfile, typed: Settings) =>
	prepareIncident(scene, profile, resolveSettings(typed, profile), 1);
/** Level of the line nearest a frequency, dBm. */
function lineDbm({ lines }: Incident, frequencyHz: number): number {
	const near = lines.filter((line) => Math.abs(line.frequencyHz - frequencyHz) < 100);
	expect(near.length, `lines at ${frequencyHz} Hz`).toBe(1);
	return dbm(near[0].re ** 2 + near[0].im ** 2);
}
const tone = (frequencyHz: number, levelDbm: number) => ({ kind: 'cw' as const, frequencyHz, levelDbm });

describe('Noise (checks A; Friis, Proc. IRE 32, 419, 1944, from memory)', () => {
	it('A3: amplifier 10 dB/2 dB, filter 1 dB, mixer 3 dB/4 dB make 2.555 dB (Pozar, Microwave Engineering 4th ed., example 10.2, from memory and computed)', () =>
		expect(dbm(cascadeNoiseFactor([stage(10, 2), lossStage(1), stage(-3, 4)]))).toBeCloseTo(2.555, 2));
	it('A4: three stages make 1.7962 dB (public explainer page, recomputed)', () =>
		expect(dbm(cascadeNoiseFactor([stage(20, 1.5), stage(15, 10), stage(20, 15)]))).toBeCloseTo(1.7962, 4));
	it('A4: four stages make 3.0360 dB (public explainer page, recomputed)', () =>
		expect(dbm(cascadeNoiseFactor([stage(15, 1.5), stage(-2, 2), stage(-6, 6), stage(20, 5)]))).toBeCloseTo(
			3.036,
			4
		));
	it('A5: a receiver of 24 dB shows −109.704 dBm of power in 10 kHz (computed)', () => {
		const { noises } = incidentOf({ emitters: [] }, ideal, {
			centreHz: 1e9,
			spanHz: 1e6,
			rbwHz: 1e4,
			attenuationDb: 0
		});
		expect(dbm(noises[0].variance(1e9))).toBeCloseTo(-109.704, 3);
	});
	it('A6: 10 dB of attenuation before 24 dB make 34.000 dB, and −99.704 dBm in 10 kHz (computed)', () => {
		expect(dbm(cascadeNoiseFactor([lossStage(10), { gain: 1, noiseFactor: ratio(24) }]))).toBeCloseTo(34, 9);
		const { noises } = incidentOf({ emitters: [] }, ideal, {
			centreHz: 1e9,
			spanHz: 1e6,
			rbwHz: 1e4,
			attenuationDb: 10
		});
		expect(dbm(noises[0].variance(1e9))).toBeCloseTo(-99.704, 3);
	});
	it('A8: 24 dB is an equivalent temperature of 72 554.7 K (computed)', () => {
		const thermal = floorDensity(
			{ ...ideal, noiseFigureDb: [{ frequencyHz: 1e9, db: 0 }] },
			{ attenuationDb: 0, preamp: false }
		)(1e9);
		const with24 = floorDensity(ideal, { attenuationDb: 0, preamp: false })(1e9);
		expect(290 * (with24 / thermal - 1)).toBeCloseTo(72554.7, 1);
	});
});

describe('Intermodulation (checks H; Pozar, Microwave Engineering 4th ed. §10.3, contents read; cubic algebra computed)', () => {
	const bent = { ...ideal, toiDbm: 15, shiDbm: 45 };
	const twoTones = (levelDbm: number, typed: Settings = {}, scene: Partial<Scene> = {}) =>
		incidentOf({ emitters: [tone(100e6, levelDbm), tone(101e6, levelDbm)], ...scene }, bent, {
			startHz: 90e6,
			stopHz: 210e6,
			rbwHz: 1e4,
			attenuationDb: 0,
			...typed
		});
	it.each([
		[-20, -90],
		[-30, -120],
		[-40, -150]
	])('H1: two tones of %d dBm at TOI +15 dBm make %d dBm', (levelDbm, expectedDbm) => {
		// −150 dBm in 10 kHz would be 20 dB under k·T₀·B and dropped: a narrower filter keeps it.
		const incident = twoTones(levelDbm, { startHz: 98e6, stopHz: 103e6, rbwHz: 100, sweepTimeS: 1 });
		expect(lineDbm(incident, 99e6)).toBeCloseTo(expectedDbm, 1);
		expect(lineDbm(incident, 102e6)).toBeCloseTo(expectedDbm, 1);
	});
	it.each([
		[-20, -85],
		[-30, -105]
	])('H1: a tone of %d dBm at SHI +45 dBm has a second harmonic of %d dBm', (levelDbm, expectedDbm) =>
		expect(
			lineDbm(
				incidentOf({ emitters: [tone(100e6, levelDbm)] }, bent, {
					startHz: 90e6,
					stopHz: 210e6,
					rbwHz: 1e4,
					attenuationDb: 0
				}),
				200e6
			)
		).toBeCloseTo(expectedDbm, 1)
	);
	it('H2: 10 dB more attenuation lowers the receiver’s third order by 20 dB and second by 10, raises noise by 10', () => {
		const [without, behind] = [twoTones(-20), twoTones(-20, { attenuationDb: 10 })];
		expect(lineDbm(without, 99e6) - lineDbm(behind, 99e6)).toBeCloseTo(20, 2);
		expect(lineDbm(without, 200e6) - lineDbm(behind, 200e6)).toBeCloseTo(10, 1);
		expect(dbm(behind.noises[0].variance(95e6) / without.noises[0].variance(95e6))).toBeCloseTo(10, 9);
	});
	it('H2: 10 dB more attenuation does not move what the device made', () => {
		const device = { toiDbm: -5, shiDbm: null };
		const [without, behind] = [20, 30].map((attenuationDb) => twoTones(-30, { attenuationDb }, { device }));
		expect(lineDbm(without, 99e6)).toBeCloseTo(-80, 1);
		expect(lineDbm(behind, 99e6) - lineDbm(without, 99e6)).toBeCloseTo(0, 1);
	});
	it('H5: a pure cubic compresses by 1 dB 9.6357 dB under its intercept', () => {
		expect(COMPRESSION_UNDER_TOI_DB).toBeCloseTo(9.6357, 4);
		const level = 15 - COMPRESSION_UNDER_TOI_DB;
		const incident = incidentOf({ emitters: [tone(100e6, level)] }, bent, {
			centreHz: 100e6,
			spanHz: 1e6,
			attenuationDb: 0
		});
		expect(level - lineDbm(incident, 100e6)).toBeCloseTo(1, 6);
	});
	it('H7: a device of +5 dBm intercept and 20 dB gain before a +15 dBm receiver make −5.414 dBm together, products in phase', () => {
		// The gain stands in the path, as a loss of −20 dB; the device's intercept is at its input, as everything at the reference plane.
		const level = -60;
		const incident = incidentOf(
			{
				emitters: [tone(100e6, level), tone(101e6, level)],
				device: { toiDbm: 5, shiDbm: null },
				path: [{ frequencyHz: 1e6, lossDb: -20 }]
			},
			{ ...bent, shiDbm: null },
			{ startHz: 98e6, stopHz: 103e6, rbwHz: 100, sweepTimeS: 1, attenuationDb: 0 }
		);
		const product = lineDbm(incident, 99e6) - 20;
		expect((3 * level - product) / 2).toBeCloseTo(-5.414, 2);
	});
	it('W7: tones of −20 dBm show −90.0 dBm without attenuation and −110.0 dBm behind 10 dB (worked task, computed)', () => {
		const typed = { startHz: 98e6, stopHz: 103e6, rbwHz: 100, sweepTimeS: 1 };
		expect(lineDbm(twoTones(-20, typed), 102e6)).toBeCloseTo(-90, 1);
		expect(lineDbm(twoTones(-20, { ...typed, attenuationDb: 10 }), 102e6)).toBeCloseTo(-110, 1);
	});
});

interface Vector {
	input: { scene: Scene; receiver: ReceiverProfile; settings: Settings };
	expect: { stat: string; fromHz?: number; toHz?: number; value: number; tolerance: number }[];
}
function readVector(name: string): { vector: Vector; incident: Incident; settings: ResolvedSettings } {
	const vector = JSON.parse(readFileSync(new URL(`vectors/${name}.json`, import.meta.url), 'utf8')) as Vector;
	const profile = receiverProfile.parse(vector.input.receiver);
	const settings = resolveSettings(settingsSchema.parse(vector.input.settings), profile);
	return {
		vector,
		settings,
		incident: prepareIncident(sceneSchema.parse(vector.input.scene), profile, settings, 11)
	};
}

describe('Computed vectors, as what reaches the filter', () => {
	it.each([
		'floor-attenuation',
		'floor-preamp',
		'phase-noise',
		'phase-noise-receiver',
		'regrowth-noise',
		'regrowth-qpsk',
		'digital-4-1000000',
		'digital-16-250000',
		'multicarrier'
	])('%s: noise power over the stated stretch', (name) => {
		const { vector, incident, settings } = readVector(name);
		const means = vector.expect.filter(({ stat }) => stat === 'mean-power');
		expect(means.length).toBeGreaterThan(0);
		const step = settings.spanHz / (settings.points - 1);
		for (const { fromHz = settings.startHz, toHz = settings.stopHz, value, tolerance } of means) {
			let sum = 0;
			let count = 0;
			for (let i = 0; i < settings.points; i++) {
				const frequencyHz = settings.startHz + i * step;
				if (frequencyHz < fromHz || frequencyHz > toHz) continue;
				sum += incident.noises[0].variance(frequencyHz);
				count++;
			}
			expect(
				Math.abs(dbm(sum / count) - value),
				`${fromHz} Hz: ${dbm(sum / count)}, not ${value}`
			).toBeLessThan(tolerance);
		}
	});

	it.each([
		'two-tone',
		'two-tone-attenuated',
		'compression',
		'saturation',
		'second-harmonic',
		'device-and-receiver',
		'preamp-two-tone',
		'path'
	])('%s: strongest line of the stated stretch', (name) => {
		const { vector, incident, settings } = readVector(name);
		for (const { fromHz = settings.startHz, toHz = settings.stopHz, value, tolerance } of vector.expect) {
			const powers = incident.lines
				.filter(({ frequencyHz }) => frequencyHz >= fromHz && frequencyHz <= toHz)
				.map(({ re, im }) => re * re + im * im);
			const correctionDb = settings.correctionDb as number;
			expect(
				Math.abs(dbm(Math.max(...powers)) + correctionDb - value),
				`${dbm(Math.max(...powers))}`
			).toBeLessThan(tolerance);
		}
	});

	it('phase-noise-inside: near its carrier the skirt is named on the line and adds no power', () => {
		const { incident } = readVector('phase-noise-inside');
		expect(incident.lines).toHaveLength(1);
		expect(incident.lines[0].skirt).toEqual([
			[
				{ offsetHz: 10, dbcPerHz: -55 },
				{ offsetHz: 100, dbcPerHz: -55 }
			]
		]);
		// k·T₀·B of the 100 kHz filter alone.
		expect(dbm(incident.noises[0].variance(1e9))).toBeCloseTo(-173.975 + dbm(106446.7), 2);
	});
});
