/** Published and computed values of distortion, bandwidths and adjacent channels. */
import { describe, expect, it } from 'vitest';
import type { Emitter, EmitterOf, Scene } from '$lib/schemas/scene';
import type { Quantity } from '$lib/schemas/quantity';
import { distort } from '$lib/server/bench/signal/nonlinearity';
import { lineOf } from '$lib/server/bench/signal/comb';
import { truth } from '$lib/server/bench/truth/truth';
import { milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';

const cwOf = (frequencyHz: number, levelDbm: number): EmitterOf<'cw'> => ({
	kind: 'cw',
	frequencyHz,
	levelDbm
});
const valueOf = (scene: Scene, quantity: Quantity): number => truth(scene, quantity).value;
const only = (emitter: Emitter): Scene => ({ emitters: [emitter] });

describe('two tones through a device', () => {
	// Pozar, Microwave Engineering, §10.3 (contents read): 3P − 2·TOI, 2P − SHI; the cubic's algebra computed.
	const twoTones = (levelDbm: number, toiDbm: number | null, shiDbm: number | null): Scene => ({
		emitters: [cwOf(100e6, levelDbm), cwOf(101e6, levelDbm)],
		device: { toiDbm, shiDbm }
	});
	it.each([
		[-20, -90],
		[-30, -120],
		[-40, -150]
	])('of %f dBm each and TOI +15 make products at %f dBm', (levelDbm, productDbm) => {
		const scene = twoTones(levelDbm, 15, null);
		expect(valueOf(scene, { kind: 'marker', atHz: 99e6 })).toBeCloseTo(productDbm, 9);
		expect(valueOf(scene, { kind: 'marker', atHz: 102e6 })).toBeCloseTo(productDbm, 9);
	});
	it.each([
		[-20, -85],
		[-30, -105]
	])(
		'of %f dBm and SHI +45 have second harmonics at %f dBm, sums and differences 6.02 dB higher',
		(levelDbm, h2Dbm) => {
			const scene = twoTones(levelDbm, null, 45);
			expect(valueOf(scene, { kind: 'marker', atHz: 200e6 })).toBeCloseTo(h2Dbm, 9);
			expect(valueOf(scene, { kind: 'marker', atHz: 201e6 })).toBeCloseTo(h2Dbm + 6.0206, 4);
			expect(valueOf(scene, { kind: 'marker', atHz: 1e6 })).toBeCloseTo(h2Dbm + 6.0206, 4);
		}
	);
	it('10 dB more attenuation in front takes 20 dB off third-order products referred to the input, 10 dB off second', () => {
		const shown = (attenuationDb: number, atHz: number) =>
			valueOf(twoTones(-20 - attenuationDb, 15, 45), { kind: 'marker', atHz }) + attenuationDb;
		expect(shown(10, 99e6) - shown(0, 99e6)).toBeCloseTo(-20, 9);
		expect(shown(10, 200e6) - shown(0, 200e6)).toBeCloseTo(-10, 9);
	});
	it('have the greatest range at (2·TOI + N)/3: 90.00 dB at −30.00 dBm for TOI +15 and noise at −120', () => {
		const rangeAt = (levelDbm: number) => {
			const productDbm = valueOf(twoTones(levelDbm, 15, null), { kind: 'marker', atHz: 99e6 });
			return levelDbm - Math.max(productDbm, -120);
		};
		expect(rangeAt(-30)).toBeCloseTo(90, 9);
		expect(rangeAt(-29)).toBeLessThan(90);
		expect(rangeAt(-31)).toBeLessThan(90);
	});
	it('peak 3.0103 dB over their mean and 6.0206 dB over one (computed)', () => {
		const powerDbm = valueOf(
			{ emitters: twoTones(-20, null, null).emitters },
			{
				kind: 'band-power',
				startHz: 90e6,
				stopHz: 110e6
			}
		);
		const crestDbm = milliwattsToDbm((2 * Math.sqrt(1e-2)) ** 2);
		expect(crestDbm - powerDbm).toBeCloseTo(3.0103, 4);
		expect(crestDbm + 20).toBeCloseTo(6.0206, 4);
	});
});

describe('the cubic stage', () => {
	const outOf = (levelDbm: number): number => {
		const [line] = distort([lineOf(1e9, 10 ** (levelDbm / 10), 0.3)], [], { toiDbm: 10, shiDbm: null }).lines;
		return milliwattsToDbm(line.re ** 2 + line.im ** 2);
	};
	it('is 1 dB compressed at TOI − 9.6357 (−10 log10(1 − 10^−0.05), computed)', () =>
		expect(outOf(10 - 9.6357) - (10 - 9.6357)).toBeCloseTo(-1, 4));
	it('stays at its greatest output beyond 1/3 of its intercept power', () => {
		expect(outOf(10 + powerRatioToDb(1 / 3))).toBeCloseTo(10 + powerRatioToDb(4 / 27), 9);
		expect(outOf(30)).toBeCloseTo(10 + powerRatioToDb(4 / 27), 9);
	});
	it('in a chain behind 20 dB of gain makes +5 dBm and +15 dBm into −5.414 dBm: products add as voltages (computed)', () => {
		const tones = [lineOf(1e9, 1e-7, 0), lineOf(1.001e9, 1e-7, 0)];
		const first = distort(tones, [], { toiDbm: 5, shiDbm: null }).lines;
		const amplified = first.map((line) => ({ ...line, re: 10 * line.re, im: 10 * line.im }));
		const { lines } = distort(amplified, [], { toiDbm: 15, shiDbm: null });
		const product = lines.find((line) => Math.round(line.frequencyHz) === 1.002e9)!;
		const productDbm = milliwattsToDbm(product.re ** 2 + product.im ** 2) - 20;
		expect((3 * -70 - productDbm) / 2).toBeCloseTo(-5.414, 3);
	});
});

describe('total harmonic distortion', () => {
	it('of −40 and −50 dBc is 1.04881 % (computed)', () => {
		const scene = { emitters: [cwOf(10e6, 0), cwOf(20e6, -40), cwOf(30e6, -50)] };
		expect(valueOf(scene, { kind: 'thd', fundamentalHz: 10e6, count: 2 })).toBeCloseTo(1.04881, 5);
	});
});

describe('an ideal 3.84 Msymbol/s signal', () => {
	const emitter: Emitter = {
		kind: 'digital',
		frequencyHz: 2e9,
		levelDbm: -20,
		symbolRateHz: 3.84e6,
		rollOff: 0.22,
		order: 4
	};
	const adjacent = (rrcRollOff?: number): Quantity => ({
		kind: 'adjacent-channel',
		centreHz: 2e9,
		widthHz: 3.84e6,
		offsets: [
			{ offsetHz: 5e6, widthHz: 3.84e6 },
			{ offsetHz: 10e6, widthHz: 3.84e6 }
		],
		rrcRollOff
	});
	it('has nothing in its neighbours 5 MHz away: 2.3424 + 2.3424 < 5 MHz (computed), shown as −200 dBc', () =>
		expect(valueOf(only(emitter), adjacent(0.22))).toBe(-200));
	// Closed form 10 log10(1 − α/4): own channel behind the root-raised-cosine weighting.
	it.each([
		[0.22, -0.2457],
		[0.35, -0.3977],
		[1, -1.2494]
	])('of roll-off %f loses %f dB to the weighting of its own channel', (rollOff, lossDb) => {
		const parts = truth(only({ ...emitter, rollOff }), adjacent(rollOff)).parts as {
			levelDbm: number;
			dbc: number;
		}[];
		expect(parts[0].levelDbm - parts[0].dbc + 20).toBeCloseTo(lossDb, 4);
	});
	it('white noise through the weighting has a noise bandwidth of exactly the symbol rate, 65.843 dB·Hz', () => {
		const noise: Emitter = { kind: 'noise', densityDbmPerHz: -100, startHz: 1e9, stopHz: 3e9 };
		const parts = truth(only(noise), adjacent(0.22)).parts as { levelDbm: number; dbc: number }[];
		expect(parts[0].levelDbm - parts[0].dbc + 100).toBeCloseTo(65.843, 3);
	});
});

describe('occupied bandwidth', () => {
	// Radio Regulations 1.153 (as quoted in two secondary pages): β/2 below and β/2 above, not the smallest width.
	it('leaves 0.5 % on either side of an asymmetric spectrum', () => {
		const scene: Scene = {
			emitters: [
				{ kind: 'noise', densityDbmPerHz: -60, startHz: 100e6, stopHz: 101e6 },
				{ kind: 'noise', densityDbmPerHz: -80, startHz: 101e6, stopHz: 103e6 }
			]
		};
		const { parts } = truth(scene, { kind: 'occupied-bandwidth', percent: 99 });
		// Powers 1 and 0.02 of the same unit: 0.5 % of 1.02 is 0.0051, at 1 a MHz below and at 0.01 a MHz above.
		expect((parts as { lowerHz: number }).lowerHz).toBeCloseTo(100e6 + 0.0051e6, 1);
		expect((parts as { upperHz: number }).upperHz).toBeCloseTo(103e6 - 0.51e6, 1);
	});
	it('26 dB down: 30 % AM by 10 kHz is 20 kHz wide, 5 % AM has no such width (computed)', () => {
		const am = (depth: number): Scene =>
			only({ kind: 'am', frequencyHz: 1e6, levelDbm: 0, modulatingHz: 10e3, depth });
		expect(valueOf(am(0.3), { kind: 'x-db-bandwidth', db: 26 })).toBe(20e3);
		expect(() => truth(am(0.05), { kind: 'x-db-bandwidth', db: 26 })).toThrow(
			/no second line is within 26 dB/
		);
	});
	it('AM of 30 % at −20 dBm: carrier −20.000, sidebands −36.478, together −19.809 dBm (computed)', () => {
		const scene = only({ kind: 'am', frequencyHz: 100e6, levelDbm: -20, modulatingHz: 10e3, depth: 0.3 });
		expect(valueOf(scene, { kind: 'marker', atHz: 100e6 })).toBeCloseTo(-20, 9);
		expect(valueOf(scene, { kind: 'marker', atHz: 100.01e6 })).toBeCloseTo(-36.478, 3);
		expect(valueOf(scene, { kind: 'channel-power', centreHz: 100e6, widthHz: 50e3 })).toBeCloseTo(-19.809, 3);
		expect(valueOf(scene, { kind: 'am-depth', carrierHz: 100e6 })).toBeCloseTo(30, 9);
	});
});
