import { describe, expect, it } from 'vitest';
import type { Emitter, Scene } from '$lib/schemas/scene';
import { ask, cw, noise, qpsk, refusal, scene } from './asked';

describe('truth(scene, adjacent-channel)', () => {
	it('gives both sides of every offset, and the worst as the value', () => {
		const beside = scene(qpsk, noise(-100, 1.0045e9, 1.0055e9));
		const { value, unit, parts } = ask(beside, {
			kind: 'adjacent-channel',
			centreHz: 1e9,
			widthHz: 2e6,
			offsets: [{ offsetHz: 5e6, widthHz: 2e6 }]
		});
		expect(value).toBeCloseTo(-20, 9);
		expect(unit).toBe('dBc');
		expect(parts).toEqual([
			{ offsetHz: 5e6, side: 'lower', levelDbm: expect.closeTo(-220, 9), dbc: -200 },
			{ offsetHz: 5e6, side: 'upper', levelDbm: expect.closeTo(-40, 9), dbc: expect.closeTo(-20, 9) }
		]);
	});
	it('shows what the device grows, 2 dB more for every dB', () => {
		const through = (levelDbm: number): Scene => ({
			emitters: [{ ...qpsk, levelDbm } as Emitter],
			device: { toiDbm: 20, shiDbm: null }
		});
		const leak = (levelDbm: number) =>
			ask(through(levelDbm), {
				kind: 'adjacent-channel',
				centreHz: 1e9,
				widthHz: 1.3e6,
				offsets: [{ offsetHz: 1.3e6, widthHz: 1.1e6 }]
			}).value;
		expect(leak(-10) - leak(-20)).toBeCloseTo(20, 1);
		expect(leak(-20)).toBeGreaterThan(-110);
	});
});

describe('truth(scene, harmonics | thd | intercept)', () => {
	const device = { toiDbm: 15, shiDbm: 45 };
	it('are what the device makes, against the carrier as it leaves it', () => {
		const of: Scene = { emitters: [cw(50e6, -20)], device };
		const { value, parts } = ask(of, { kind: 'harmonics', fundamentalHz: 50e6, count: 3 });
		const list = parts as { n: number; frequencyHz: number; levelDbm: number; dbc: number }[];
		expect(list.map(({ n, frequencyHz }) => [n, frequencyHz])).toEqual([
			[2, 100e6],
			[3, 150e6],
			[4, 200e6]
		]);
		expect(list[0].levelDbm).toBeCloseTo(-85, 9);
		expect(list[1].levelDbm).toBeCloseTo(-99.5424, 4);
		expect(list[2].dbc).toBe(-200);
		expect(value).toBe(list[0].dbc);
		expect(ask(of, { kind: 'thd', fundamentalHz: 50e6, count: 1 }).value).toBeCloseTo(
			100 * 10 ** (value / 20),
			9
		);
	});
	it('the intercept is the device’s own; without one it is refused', () => {
		const tones = [cw(100e6, -20), cw(101e6, -20)];
		expect(
			ask({ emitters: tones, device }, { kind: 'intercept', lowerHz: 100e6, upperHz: 101e6 })
		).toMatchObject({
			value: 15,
			unit: 'dBm',
			parts: { lowerDbm: 15, upperDbm: 15 }
		});
		expect(refusal({ emitters: tones }, { kind: 'intercept', lowerHz: 100e6, upperHz: 101e6 })).toBe('kind');
	});
});

describe('truth(scene, modulation and time)', () => {
	it('are what the emitter was given', () => {
		const common = { frequencyHz: 1e8, levelDbm: -30, modulatingHz: 5e3 };
		expect(
			ask(scene({ kind: 'am', ...common, depth: 0.42 }), { kind: 'am-depth', carrierHz: 1e8 })
		).toMatchObject({
			value: expect.closeTo(42, 9),
			unit: '%'
		});
		expect(
			ask(scene({ kind: 'fm', ...common, deviationHz: 12e3 }), { kind: 'fm-deviation', carrierHz: 1e8 })
		).toMatchObject({ value: 12e3, unit: 'Hz', parts: { modulatingHz: 5e3, index: 2.4 } });
		expect(
			ask(scene({ kind: 'pm', ...common, deviationRad: 2 }), { kind: 'fm-deviation', carrierHz: 1e8 }).value
		).toBe(10e3);
		const pulsed: Emitter = { kind: 'pulsed', frequencyHz: 1e9, levelDbm: 0, widthS: 2e-6, periodS: 1e-3 };
		expect(ask(scene(pulsed), { kind: 'pulse', carrierHz: 1e9 })).toMatchObject({
			value: 2e-6,
			unit: 's',
			parts: { widthS: 2e-6, repetitionHz: 1e3 }
		});
		expect(ask(scene(cw(1e9, 0, { gate: { onS: 0.2, offS: 0.3 } })), { kind: 'time' })).toMatchObject({
			value: 0.2,
			parts: { periodS: 0.5 }
		});
	});
	it('the depth behind a device is that of the lines that leave it', () => {
		const am: Emitter = { kind: 'am', frequencyHz: 1e8, levelDbm: 0, modulatingHz: 5e3, depth: 0.5 };
		const { value } = ask(
			{ emitters: [am], device: { toiDbm: 10, shiDbm: null } },
			{ kind: 'am-depth', carrierHz: 1e8 }
		);
		// Small signals are gained by 1 − 3p, p the carrier over the intercept, where the carrier has 1 − p: depth falls.
		expect(value).toBeLessThan(50);
		expect(value).toBeGreaterThan(35);
	});
	it('phase noise is the table’s, either side; beyond its reach it is refused', () => {
		const noisy = scene(
			cw(1e9, -10, {
				phaseNoise: [
					{ offsetHz: 1e3, dbcPerHz: -90 },
					{ offsetHz: 1e5, dbcPerHz: -130 }
				]
			})
		);
		expect(ask(noisy, { kind: 'phase-noise', carrierHz: 1e9, offsetHz: -1e4 })).toMatchObject({
			value: expect.closeTo(-110, 9),
			unit: 'dBc/Hz'
		});
		expect(refusal(noisy, { kind: 'phase-noise', carrierHz: 1e9, offsetHz: 2e6 })).toBe('offsetHz');
		expect(refusal(scene(qpsk), { kind: 'phase-noise', carrierHz: 1e9, offsetHz: 1e4 })).toBe('carrierHz');
	});
});

describe('truth(scene, mask)', () => {
	const limits = [
		{ startHz: 100e6, stopHz: 200e6, levelDbm: -50 },
		{ startHz: 200e6, stopHz: 300e6, levelDbm: -36 }
	];
	it('finds the line with the least margin, whatever its level', () => {
		const spurs = scene(cw(150e6, -52), cw(250e6, -40), cw(400e6, 0));
		expect(ask(spurs, { kind: 'mask', limits })).toMatchObject({
			value: expect.closeTo(2, 9),
			unit: 'dB',
			parts: { segment: 0, frequencyHz: 150e6, marginDb: expect.closeTo(2, 9) }
		});
	});
	it('needs a reference bandwidth as soon as there is more than lines, then takes the worst window', () => {
		const wide = scene({ ...qpsk, frequencyHz: 250e6, levelDbm: -20 } as Emitter);
		expect(refusal(wide, { kind: 'mask', limits })).toBe('bandwidthHz');
		const { value, parts } = ask(wide, { kind: 'mask', limits, bandwidthHz: 100e3 });
		expect(value).toBeCloseTo(-36 + 20 + 10, 4);
		expect((parts as { segment: number }).segment).toBe(1);
	});
	it('refuses an empty mask', () =>
		expect(refusal(scene(cw(1e9, 0)), { kind: 'mask', limits })).toBe('limits'));
});
