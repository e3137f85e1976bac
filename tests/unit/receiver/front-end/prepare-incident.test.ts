import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { type Emitter } from '$lib/schemas/scene';
import { prepareIncident } from '$lib/server/bench/receiver/front-end/prepare-incident';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { field } from '$lib/server/bench/receiver/profiles';
import { dbm, here, ideal, incident, powerOf, qpsk, tone } from './incident';

describe('prepareIncident: the connection', () => {
	it('takes path and pad off signals, and leaves the floor where it is', () => {
		const path = [
			{ frequencyHz: 0.9e9, lossDb: 2 },
			{ frequencyHz: 1.1e9, lossDb: 6 }
		];
		const plain = incident([tone(1e9, -20)]);
		const behind = incident([tone(1e9, -20)], { scene: { path }, settings: { input: { padDb: 20 } } });
		expect(dbm(powerOf(plain.lines[0]))).toBeCloseTo(-20, 9);
		expect(dbm(powerOf(behind.lines[0]))).toBeCloseTo(-44, 9);
		expect(behind.noises[0].variance(1.005e9)).toBe(plain.noises[0].variance(1.005e9));
	});
	it('takes a sloping path off a density frequency by frequency', () => {
		const noise: Emitter = { kind: 'noise', densityDbmPerHz: -80, startHz: 0.98e9, stopHz: 1.02e9 };
		const path = [
			{ frequencyHz: 0.99e9, lossDb: 0 },
			{ frequencyHz: 1.01e9, lossDb: 10 }
		];
		const [plain, behind] = [incident([noise]), incident([noise], { scene: { path } })].map(
			(i) => i.noises[0]
		);
		for (const [frequencyHz, lossDb] of [
			[0.992e9, 1],
			[1e9, 5],
			[1.009e9, 9.5]
		])
			expect(dbm(plain.variance(frequencyHz) / behind.variance(frequencyHz))).toBeCloseTo(lossDb, 1);
	});
	it('not connected shows the floor alone, with the receiver’s own responses', () => {
		const alone = incident([tone(1e9, 10), qpsk()], {
			profile: field,
			settings: { input: { connected: false } }
		});
		expect(
			alone.lines.every(({ frequencyHz }) =>
				[0, ...field.residuals.map((r) => r.frequencyHz)].includes(frequencyHz)
			)
		).toBe(true);
		expect(alone.envelopes).toEqual([]);
		expect(alone.overload).toBe(false);
		expect(alone.noises[0].variance(1e9)).toBeCloseTo(
			incident([], { profile: field }).noises[0].variance(1e9),
			25
		);
	});
	it('shows residuals and feedthrough at their level + attenuation − gain', () => {
		const settings = { startHz: 20e3, stopHz: 60e6, attenuationDb: 20, preamp: true };
		const { lines } = incident([], { profile: field, settings });
		const at = (frequencyHz: number) => dbm(powerOf(lines.find((line) => line.frequencyHz === frequencyHz)!));
		expect(at(48.37e6)).toBeCloseTo(-108.6 + 20 - 18.3, 9);
		expect(at(0)).toBeCloseTo(-31.5 + 20 - 18.3, 9);
	});
});

describe('prepareIncident: laws', () => {
	it('more attenuation always raises the floor, and leaves signals before an ideal mixer', () =>
		fc.assert(
			fc.property(
				fc.constantFrom(0, 5, 10, 20),
				fc.constantFrom(5, 10, 20),
				fc.boolean(),
				(from, more, preamp) => {
					const [a, b] = [from, from + more].map((attenuationDb) =>
						incident([tone(1e9, -40), qpsk()], { settings: { attenuationDb, preamp } })
					);
					expect(b.noises[0].variance(0.993e9)).toBeGreaterThan(a.noises[0].variance(0.993e9));
					expect(dbm(powerOf(b.lines[0]))).toBeCloseTo(dbm(powerOf(a.lines[0])), 9);
				}
			),
			{ numRuns: 20 }
		));
	it('powers add before an ideal front end', () =>
		fc.assert(
			fc.property(
				fc.array(
					fc.record({
						frequencyHz: fc.double({ min: 0.995e9, max: 1.005e9, noNaN: true }),
						levelDbm: fc.double({ min: -60, max: -20, noNaN: true }),
						order: fc.constantFrom(4 as const, 16 as const)
					}),
					{ minLength: 1, maxLength: 4 }
				),
				fc.double({ min: 0.995e9, max: 1.005e9, noNaN: true }),
				(signals, tunedHz) => {
					const emitters = signals.map((signal) => qpsk(signal));
					const floor = incident([]).noises[0].variance(tunedHz);
					const together = incident(emitters).noises[0].variance(tunedHz) - floor;
					const alone = emitters.reduce(
						(sum, one) => sum + incident([one]).noises[0].variance(tunedHz) - floor,
						0
					);
					expect(Math.abs(together - alone)).toBeLessThan(1e-3 * alone + 1e-3 * floor);
				}
			),
			{ numRuns: 25 }
		));
	it('is the same for the same seed, and turns phases for another', () => {
		const scene = { emitters: [tone(1e9, -20), tone(1.001e9, -20)] };
		const settings = resolveSettings(here, ideal);
		const lines = (seed: number | string) => prepareIncident(scene, ideal, settings, seed).lines;
		expect(lines('a1')).toEqual(lines('a1'));
		expect(lines('a1')).not.toEqual(lines('a2'));
	});
	it('level means total: a carrier and its skirts hold the power stated', () => {
		const phaseNoise = [
			{ offsetHz: 2e5, dbcPerHz: -80 },
			{ offsetHz: 4e5, dbcPerHz: -80 }
		];
		const { lines, noises } = incident([tone(1e9, -10, { phaseNoise })], { settings: { rbwHz: 10e3 } });
		const floor = incident([], { settings: { rbwHz: 10e3 } }).noises[0];
		let skirts = 0;
		const step = 5e3;
		for (let f = 0.9955e9; f < 1.0045e9; f += step)
			skirts += ((noises[0].variance(f) - floor.variance(f)) * step) / 10644.67;
		expect(powerOf(lines[0])).toBeLessThan(0.93 * 0.1);
		// The ±3.5 B about the carrier hold phase, not density: 1 % of the skirts.
		expect(dbm(powerOf(lines[0]) + skirts)).toBeCloseTo(-10, 2);
	});
});

describe('prepareIncident: comings and goings', () => {
	it('a slow gate, a hop and a drift are timings of a line', () => {
		const gate = { onS: 0.05, offS: 0.05 };
		const hop = { channelsHz: [1e9, 1.001e9], dwellS: 0.01 };
		const { lines } = incident([
			tone(1e9, -30, { gate }),
			tone(1e9, -30, { hop }),
			tone(1e9, -30, { drift: { hzPerS: 500 } })
		]);
		expect(lines.map(({ timing }) => timing)).toEqual([
			{ emitter: 0, gate },
			{ emitter: 1, hop },
			{ emitter: 2, driftHzPerS: 500 }
		]);
	});
	it('a gate at least as fast as B/2 breaks a line into its lines, powers by the square of duty·sinc', () => {
		const { lines } = incident([tone(1e9, -20, { gate: { onS: 2.5e-6, offS: 7.5e-6 } })], {
			settings: { rbwHz: 10e3, spanHz: 500e3 }
		});
		expect(lines.every(({ timing }) => timing === undefined)).toBe(true);
		const at = (offsetHz: number) =>
			dbm(powerOf(lines.find(({ frequencyHz }) => Math.abs(frequencyHz - 1e9 - offsetHz) < 1)!));
		expect(at(0)).toBeCloseTo(-20 + 20 * Math.log10(0.25), 6);
		expect(at(-100e3)).toBeCloseTo(-20 + 20 * Math.log10(Math.sin(Math.PI / 4) / Math.PI), 6);
	});
	it('the same gate takes its share off a density', () => {
		const gate = { onS: 2e-7, offS: 8e-7 };
		const [on, gated] = [incident([qpsk()]), incident([qpsk({ gate })])];
		expect(on.noises).toHaveLength(1);
		expect(gated.noises).toHaveLength(1);
		expect(dbm(gated.noises[0].variance(1e9) / on.noises[0].variance(1e9))).toBeCloseTo(dbm(0.2), 2);
	});
	it('a slow gate gives a density a noise of its own, and the floor loses it', () => {
		const gate = { onS: 0.02, offS: 0.03 };
		const { noises } = incident([qpsk({ gate })]);
		expect(noises).toHaveLength(2);
		expect(noises[1]).toMatchObject({ timing: { emitter: 0, gate }, centreHz: 1e9 });
		expect(noises[0].variance(1e9)).toBeCloseTo(incident([]).noises[0].variance(1e9), 20);
		expect(dbm(noises[1].variance(1e9))).toBeCloseTo(-30 - dbm(4e6) + dbm(106446.7), 2);
	});
	it('pulses slower than B/2 are one line with their timing; faster, lines at their rate', () => {
		const pulsed: Emitter = { kind: 'pulsed', frequencyHz: 1e9, levelDbm: -20, widthS: 1e-6, periodS: 1e-4 };
		expect(incident([pulsed]).lines).toMatchObject([
			{ frequencyHz: 1e9, timing: { pulse: { widthS: 1e-6, periodS: 1e-4 } } }
		]);
		const { lines } = incident([pulsed], { settings: { rbwHz: 1e3, spanHz: 110e3 } });
		expect(lines.length).toBeGreaterThan(10);
		const strongest = lines.reduce((a, b) => (powerOf(a) > powerOf(b) ? a : b));
		expect(dbm(powerOf(strongest))).toBeCloseTo(-60, 6);
	});
	it('what a gated carrier makes in the mixer is gated with it; what hops makes products that hop', () => {
		const profile = { ...ideal, shiDbm: 40 };
		const gate = { onS: 0.05, offS: 0.05 };
		const settings = { startHz: 0.1e9, stopHz: 3e9, rbwHz: 100e3 };
		const gated = incident([tone(1e9, -10, { gate })], { profile, settings });
		expect(gated.lines.find(({ frequencyHz }) => frequencyHz === 2e9)?.timing).toEqual({ emitter: 0, gate });
		const hop = { channelsHz: [1e9, 1.001e9], dwellS: 0.01 };
		const hopping = incident([tone(1e9, -10, { hop })], { profile, settings });
		expect(hopping.lines.find(({ frequencyHz }) => frequencyHz === 2e9)?.timing?.hop?.channelsHz).toEqual([
			2e9, 2.002e9
		]);
	});
	it('compression of a strong line takes the pulse at its peak', () => {
		const profile = { ...ideal, toiDbm: 11 };
		const pulsed: Emitter = { kind: 'pulsed', frequencyHz: 1e9, levelDbm: 0, widthS: 1e-6, periodS: 1e-4 };
		const shown = incident([pulsed], { profile, settings: { rbwHz: 1e3, spanHz: 110e3 } });
		const strongest = Math.max(...shown.lines.map(powerOf));
		expect(dbm(strongest)).toBeCloseTo(-40 + 20 * Math.log10(1 - 1 / 10 ** 1.1), 6);
	});
});
