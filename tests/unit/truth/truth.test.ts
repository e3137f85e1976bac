import { describe, expect, it } from 'vitest';
import { milliwattsToDbm } from '$lib/units/decibel';
import { ask, cw, noise, qpsk, refusal, scene } from './asked';

describe('truth(scene, marker | delta | peak | next-peak | count)', () => {
	const three = scene(cw(100e6, -30), cw(101e6, -20), cw(103e6, -45));
	it('is the level of the line that is meant', () => {
		expect(ask(three, { kind: 'marker', atHz: 103e6 })).toEqual({
			kind: 'marker',
			value: expect.closeTo(-45, 12),
			unit: 'dBm',
			parts: { frequencyHz: 103e6 }
		});
		expect(ask(three, { kind: 'delta', fromHz: 101e6, toHz: 103e6 })).toMatchObject({
			value: expect.closeTo(-25, 12),
			unit: 'dB',
			parts: { frequencyHz: 2e6 }
		});
		expect(ask(three, { kind: 'peak' })).toMatchObject({
			value: expect.closeTo(-20, 12),
			parts: { frequencyHz: 101e6 }
		});
		expect(ask(three, { kind: 'next-peak', fromHz: 101e6, side: 'upper' }).value).toBeCloseTo(-45, 12);
		expect(ask(three, { kind: 'next-peak', fromHz: 101e6, side: 'lower' }).value).toBeCloseTo(-30, 12);
		expect(ask(three, { kind: 'count', atHz: 100e6 })).toMatchObject({ value: 100e6, unit: 'Hz' });
	});
	it('adds the powers of lines on the same spot', () =>
		expect(ask(scene(cw(1e8, -30), cw(1e8, -30)), { kind: 'marker', atHz: 1e8 }).value).toBeCloseTo(
			-26.9897,
			4
		));
	it('counts phase-noise skirts to the level of their carrier', () => {
		const noisy = scene(cw(1e9, -10, { phaseNoise: [{ offsetHz: 1e4, dbcPerHz: -65 }] }));
		expect(ask(noisy, { kind: 'marker', atHz: 1e9 }).value).toBeCloseTo(-10, 12);
		expect(ask(noisy, { kind: 'channel-power', centreHz: 1e9, widthHz: 1e6 }).value).toBeCloseTo(-10, 9);
	});
	it('refuses where there is no line, by field', () => {
		expect(refusal(three, { kind: 'marker', atHz: 102e6 })).toBe('atHz');
		expect(refusal(three, { kind: 'delta', fromHz: 100e6, toHz: 102e6 })).toBe('toHz');
		expect(refusal(scene(qpsk), { kind: 'peak' })).toBe('kind');
		expect(refusal(three, { kind: 'next-peak', fromHz: 103e6, side: 'upper' })).toBe('side');
	});
	it('finds a drifting line where it is at that time; a count takes its mean over the gate', () => {
		const drifting = scene(cw(1e9, -10, { drift: { hzPerS: 2e4 } }));
		expect(ask(drifting, { kind: 'count', atHz: 1e9, atS: 3 }).value).toBe(1e9 + 6e4);
		expect(ask(drifting, { kind: 'count', atHz: 1e9, atS: 3, gateS: 0.5 }).value).toBe(1e9 + 6.5e4);
		expect(ask(drifting, { kind: 'marker', atHz: 1e9 + 6e4, atS: 3 }).value).toBeCloseTo(-10, 12);
	});
	it('sees a gated emitter on, a hopping one on the channel that is asked for', () => {
		expect(
			ask(scene(cw(1e9, -10, { gate: { onS: 1e-3, offS: 9e-3 } })), { kind: 'marker', atHz: 1e9 }).value
		).toBeCloseTo(-10, 12);
		const hopping = scene(cw(1e9, -10, { hop: { channelsHz: [1e9, 1.002e9, 1.004e9], dwellS: 0.1 } }));
		expect(ask(hopping, { kind: 'marker', atHz: 1.004e9 }).value).toBeCloseTo(-10, 12);
	});
});

describe('truth(scene, powers and densities)', () => {
	const mixed = scene(cw(100e6, -40), noise(-110, 99e6, 101e6));
	it('adds lines and densities inside the edges', () => {
		expect(ask(mixed, { kind: 'band-power', startHz: 99.5e6, stopHz: 100.5e6 }).value).toBeCloseTo(
			milliwattsToDbm(1e-4 + 1e-5),
			9
		);
		expect(ask(mixed, { kind: 'channel-power', centreHz: 99.4e6, widthHz: 1e6 }).value).toBeCloseTo(
			milliwattsToDbm(0.9e-5),
			9
		);
		expect(ask(mixed, { kind: 'power-density', centreHz: 99.6e6, widthHz: 0.4e6 })).toMatchObject({
			value: expect.closeTo(-110, 9),
			unit: 'dBm/Hz'
		});
		expect(ask(mixed, { kind: 'noise-density', atHz: 99.2e6 }).value).toBeCloseTo(-110, 9);
	});
	it('takes the noise out of the carrier it is compared with', () =>
		expect(
			ask(mixed, { kind: 'carrier-to-noise', carrierHz: 100e6, widthHz: 10e3, noiseHz: 99.5e6 })
		).toMatchObject({
			value: expect.closeTo(30, 9),
			unit: 'dB',
			parts: { noiseDbm: expect.closeTo(-70, 9) }
		}));
	it('refuses an empty channel by field', () => {
		expect(refusal(mixed, { kind: 'channel-power', centreHz: 200e6, widthHz: 1e6 })).toBe('centreHz');
		expect(refusal(mixed, { kind: 'noise-density', atHz: 200e6 })).toBe('atHz');
	});
	it('counts only the emitters it is told to, and refuses one that is not there', () => {
		expect(
			ask(mixed, { kind: 'channel-power', centreHz: 100e6, widthHz: 4e6, emitters: [0] }).value
		).toBeCloseTo(-40, 9);
		expect(refusal(mixed, { kind: 'peak', emitters: [0, 2] })).toBe('emitters.1');
	});
	it('of a far skirt is right to 1e-6 where the distribution alone would cancel', () => {
		const msk = scene({ kind: 'msk', frequencyHz: 1e9, levelDbm: 0, bitRateHz: 1e6 });
		// Far out S = (16/π²)·cos²(2πf)/(16f²)²·(1 + …), from 50 to 60 bit rates: Simpson over the closed form.
		let sum = 0;
		const n = 20000;
		for (let i = 0; i <= n; i++) {
			const f = 50 + (10 * i) / n;
			const value = (16 / Math.PI ** 2) * (Math.cos(2 * Math.PI * f) / (1 - 16 * f * f)) ** 2;
			sum += (value * (i === 0 || i === n ? 1 : i % 2 ? 4 : 2) * (10 / n)) / 3;
		}
		const { value } = ask(msk, { kind: 'band-power', startHz: 1.05e9, stopHz: 1.06e9 });
		expect(10 ** (value / 10) / sum).toBeCloseTo(1, 5);
	});
});

describe('truth(scene, widths)', () => {
	it('keeps to a window where one is stated', () => {
		const two = scene(noise(-60, 100e6, 101e6), noise(-60, 110e6, 111e6));
		expect(
			ask(two, { kind: 'occupied-bandwidth', percent: 99, centreHz: 100.5e6, widthHz: 4e6 })
		).toMatchObject({
			value: expect.closeTo(0.99e6, 2),
			parts: { lowerHz: expect.closeTo(100.005e6, 2), upperHz: expect.closeTo(100.995e6, 2) }
		});
		expect(ask(two, { kind: 'occupied-bandwidth', percent: 99 }).value).toBeCloseTo(10.98e6, 1);
	});
	it('of lines runs from line to line', () => {
		const am = scene({ kind: 'am', frequencyHz: 1e6, levelDbm: 0, modulatingHz: 10e3, depth: 0.8 });
		expect(ask(am, { kind: 'occupied-bandwidth', percent: 99 }).value).toBeCloseTo(20e3, 5);
		expect(ask(am, { kind: 'occupied-bandwidth', percent: 50 }).value).toBeCloseTo(0, 5);
	});
	it('of a pulse train is that of its sinc², to a line', () => {
		const pulsed = scene({ kind: 'pulsed', frequencyHz: 1e9, levelDbm: 0, widthS: 1e-6, periodS: 1e-3 });
		expect(Math.abs(ask(pulsed, { kind: 'occupied-bandwidth', percent: 99 }).value - 20.5716e6)).toBeLessThan(
			2e3
		);
		expect(ask(pulsed, { kind: 'x-db-bandwidth', db: 3.9224 }).value).toBeCloseTo(1e6, -4);
		expect(ask(pulsed, { kind: 'channel-power', centreHz: 1e9, widthHz: 2e6 }).value).toBeCloseTo(
			-30 + 10 * Math.log10(0.902823),
			4
		);
	});
	it('of a density is between its outermost crossings, sidelobes included', () => {
		const subcarriers = scene({
			kind: 'multicarrier',
			frequencyHz: 1e9,
			levelDbm: 0,
			subcarriers: 2,
			spacingHz: 1e6
		});
		const { parts } = ask(subcarriers, { kind: 'x-db-bandwidth', db: 20 });
		const { upperHz } = parts as { upperHz: number };
		const sinc2 = (x: number) => (Math.sin(Math.PI * x) / (Math.PI * x)) ** 2;
		const density = (f: number) => sinc2(f - 1) + sinc2(f + 1);
		let top = 0;
		for (let f = 0.5; f < 1.5; f += 1e-4) if (Math.abs(f - 1) > 1e-9) top = Math.max(top, density(f));
		let outermost = 0;
		for (let f = 1.5; f < 40; f += 1e-4) if (density(f) >= top / 100) outermost = f;
		expect((upperHz - 1e9) / 1e6).toBeCloseTo(outermost, 3);
	});
});
