import { describe, expect, it } from 'vitest';
import { type Emitter } from '$lib/schemas/scene';
import { dbm, ideal, incident, powerOf, qpsk, tone } from './incident';

describe('prepareIncident: what the filter makes of it', () => {
	it('a density narrower than B/2 fades at its own width', () => {
		const narrow: Emitter = { kind: 'noise', densityDbmPerHz: -80, startHz: 1e9, stopHz: 1.02e9 - 19.98e6 };
		const { noises } = incident([narrow]);
		expect(noises).toHaveLength(2);
		expect(noises[1].ownWidthHz).toBeCloseTo(20e3, 0);
		expect(dbm(noises[1].variance(1.00001e9))).toBeCloseTo(-80 + dbm(20e3), 1);
	});
	it('modulation wider than the filter is a density, narrower a waveform of its own', () => {
		expect(incident([qpsk()]).envelopes).toEqual([]);
		const { envelopes, noises } = incident([qpsk({ symbolRateHz: 1e6 })]);
		expect(noises).toHaveLength(1);
		expect(noises[0].variance(1e9)).toBeCloseTo(incident([]).noises[0].variance(1e9), 20);
		expect(envelopes).toHaveLength(1);
		expect(dbm(powerOf(envelopes[0]))).toBeCloseTo(-30, 9);
	});
	it('a waveform’s regrowth is noise beside it, and its own level is compressed', () => {
		const profile = { ...ideal, toiDbm: 11 };
		const { envelopes, noises } = incident([qpsk({ symbolRateHz: 1e6, levelDbm: -5 })], { profile });
		expect(dbm(powerOf(envelopes[0]))).toBeLessThan(-5.1);
		expect(noises[0].variance(1.001e9)).toBeGreaterThan(1e4 * incident([]).noises[0].variance(1.001e9));
	});
	it('the far lobes of an MSK waveform are noise where the waveform is not followed, and only there', () => {
		const msk: Emitter = { kind: 'msk', frequencyHz: 1e9, levelDbm: -10, bitRateHz: 1e6 };
		const { envelopes, noises } = incident([msk]);
		const floor = incident([]).noises[0];
		expect(envelopes).toHaveLength(1);
		expect(noises[0].variance(1.0017e9)).toBeCloseTo(floor.variance(1.0017e9), 22);
		// S(f) = (16/π²)·[cos 2πf/(1 − 16f²)]²/R at 2 bit rates, where the cosine is 1.
		const expected = 0.1 * (16 / Math.PI ** 2) * (1 / 63) ** 2 * 1e-6 * 106446.7;
		expect(Math.abs(dbm(noises[0].variance(1.002e9) / expected))).toBeLessThan(0.5);
	});
	it('a phase modulation makes the lines of its Bessel functions, and of twice its deviation in its harmonic', () => {
		const fm: Emitter = {
			kind: 'fm',
			frequencyHz: 1e9,
			levelDbm: -10,
			modulatingHz: 50e3,
			deviationHz: 50e3
		};
		const settings = { startHz: 0.5e9, stopHz: 3e9, rbwHz: 10e3, sweepTimeS: 1000 };
		const { lines } = incident([fm], { profile: { ...ideal, toiDbm: 40, shiDbm: 40 }, settings });
		const at = (frequencyHz: number) =>
			dbm(powerOf(lines.find((line) => Math.abs(line.frequencyHz - frequencyHz) < 1)!));
		// J₀(1) = 0.765198, J₁(1) = 0.440051; J₀(2) = 0.223891, J₁(2) = 0.576725 (checks F3, computed).
		expect(at(1e9)).toBeCloseTo(-10 + 20 * Math.log10(0.765198), 3);
		expect(at(1e9 - 50e3)).toBeCloseTo(-10 + 20 * Math.log10(0.440051), 3);
		expect(at(2e9)).toBeCloseTo(-60 + 20 * Math.log10(0.223891), 3);
		expect(at(2e9 + 50e3)).toBeCloseTo(-60 + 20 * Math.log10(0.576725), 3);
	});
	it('a tone modulation too slow to resolve is a moving line, its harmonic moves twice as far', () => {
		const fm: Emitter = { kind: 'fm', frequencyHz: 1e9, levelDbm: -10, modulatingHz: 50, deviationHz: 20e3 };
		const { envelopes, lines } = incident([fm], {
			profile: { ...ideal, shiDbm: 40 },
			settings: { startHz: 0.5e9, stopHz: 3e9 }
		});
		expect(lines).toEqual([]);
		expect(envelopes).toMatchObject([
			{ frequencyHz: 1e9, emitter: { deviationHz: 20e3 } },
			{ frequencyHz: 2e9, emitter: { deviationHz: 40e3 } }
		]);
	});
	it('the receiver’s phase noise spreads a density beyond its edge', () => {
		const noise: Emitter = { kind: 'noise', densityDbmPerHz: -80, startHz: 0.999e9, stopHz: 1.001e9 };
		const profile = {
			...ideal,
			phaseNoise: [
				{ offsetHz: 10e3, dbcPerHz: -105 },
				{ offsetHz: 10e6, dbcPerHz: -105 }
			]
		};
		const { noises } = incident([noise], { profile, settings: { rbwHz: 10e3 } });
		// −80 dBm/Hz over 2 MHz is −17 dBm; at −105 dBc/Hz that is −122 dBm/Hz.
		expect(dbm(noises[0].variance(1.004e9) / 10644.67)).toBeCloseTo(-80 + dbm(2e6) - 105, 1);
	});
	it('evaluates a sweep far wider than its filter only where it looks', () => {
		const settings = { startHz: 0, stopHz: 8e9, rbwHz: 1, sweepTimeS: 1000, points: 10001 };
		const { noises } = incident([qpsk()], { settings });
		let sum = 0;
		for (let i = 0; i <= 10000; i++) sum += noises[0].variance(i * 8e5);
		expect(dbm(sum)).toBeLessThan(-60);
		expect(dbm(noises[0].variance(1e9))).toBeCloseTo(-30 - dbm(4e6) + dbm(1.064467), 2);
	});
});

describe('prepareIncident: overload and protection', () => {
	const profile = { ...ideal, toiDbm: 11, maxSafeInputDbm: 27 };
	it('flags overload within 3 dB of compression at the mixer, pulses at their peaks', () => {
		const limit = 11 - 9.6357 - 3;
		expect(incident([tone(1e9, limit - 0.01)], { profile }).overload).toBe(false);
		expect(incident([tone(1e9, limit + 0.01)], { profile }).overload).toBe(true);
		expect(incident([tone(1e9, limit + 0.01)], { profile, settings: { attenuationDb: 5 } }).overload).toBe(
			false
		);
		const pulsed: Emitter = {
			kind: 'pulsed',
			frequencyHz: 5e9,
			levelDbm: limit + 1,
			widthS: 1e-6,
			periodS: 1e-3
		};
		expect(incident([pulsed], { profile }).overload).toBe(true);
	});
	it('trips on more than the safe power at the connector, which a pad prevents and the attenuator does not', () => {
		const strong = [tone(1e9, 25), tone(2e9, 25)];
		expect(incident(strong, { profile }).protection).toMatchObject({ reason: 'power', limitDbm: 27 });
		expect(
			incident(strong, { profile, settings: { attenuationDb: 50 } }).protection?.connectorDbm
		).toBeCloseTo(28.01, 2);
		expect(incident(strong, { profile, settings: { input: { padDb: 10 } } }).protection).toBeUndefined();
	});
	it('trips on a direct voltage without a block', () => {
		const dc: Emitter = { kind: 'dc', volts: -12 };
		expect(incident([dc], { profile }).protection).toMatchObject({ reason: 'dc' });
		expect(incident([dc], { profile, settings: { input: { dcBlock: true } } }).protection).toBeUndefined();
		expect(incident([{ kind: 'dc', volts: 0.02 }], { profile }).protection).toBeUndefined();
	});
	it('refuses a phase noise beyond small angles by name', () =>
		expect(() => incident([tone(1e9, 0, { phaseNoise: [{ offsetHz: 1e3, dbcPerHz: -35 }] })])).toThrow(
			/scene\.emitters\.0\.phaseNoise/
		));
});
