import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { scene as sceneSchema, type Emitter, type Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { prepareIncident } from '$lib/server/bench/receiver/front-end/prepare-incident';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { field } from '$lib/server/bench/receiver/profiles';

const dbm = (milliwatts: number) => 10 * Math.log10(milliwatts);
const powerOf = ({ re, im }: { re: number; im: number }) => re * re + im * im;
const ideal: ReceiverProfile = {
	...field,
	name: 'ideal',
	startHz: 0,
	toiDbm: null,
	shiDbm: null,
	phaseNoise: null,
	residuals: [],
	loFeedthroughDbm: undefined,
	referencePpm: 0
};
const common: Settings = { rbwHz: 100e3, attenuationDb: 0 };
const here: Settings = { centreHz: 1e9, spanHz: 20e6, ...common };
const incident = (
	emitters: Emitter[],
	{
		scene = {},
		profile = ideal,
		settings = {}
	}: { scene?: Partial<Scene>; profile?: ReceiverProfile; settings?: Settings } = {}
) =>
	prepareIncident(
		sceneSchema.parse({ emitters, ...scene }),
		profile,
		resolveSettings({ ...(settings.startHz === undefined ? here : common), ...settings }, profile),
		1
	);
const tone = (frequencyHz: number, levelDbm: number, more = {}): Emitter => ({
	kind: 'cw',
	frequencyHz,
	levelDbm,
	...more
});
const qpsk = (more = {}): Emitter => ({
	kind: 'digital',
	frequencyHz: 1e9,
	levelDbm: -30,
	symbolRateHz: 4e6,
	rollOff: 0.22,
	order: 4,
	...more
});

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
