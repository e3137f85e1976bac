import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Emitter, EmitterOf } from '$lib/schemas/scene';
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { phaseNoiseDensity } from '$lib/server/bench/signal/phase-noise';

const carrier = { frequencyHz: 1e9, levelDbm: -10 };
const digital: EmitterOf<'digital'> = {
	kind: 'digital',
	...carrier,
	symbolRateHz: 1e6,
	rollOff: 0.22,
	order: 4
};
const msk: EmitterOf<'msk'> = { kind: 'msk', ...carrier, bitRateHz: 1e6 };
const pulsed: EmitterOf<'pulsed'> = { kind: 'pulsed', ...carrier, widthS: 1e-6, periodS: 1e-4 };
const fm: EmitterOf<'fm'> = { kind: 'fm', ...carrier, modulatingHz: 1e3, deviationHz: 150e3 };
const phases = { carrierRad: 0.7, modulationRad: 2.1 };
const levelMw = 0.1;

describe('behaviour(emitter, rbwHz)', () => {
	it.each<[Emitter, number, string]>([
		[digital, 0.05e6, 'density'],
		[digital, 0.0501e6, 'envelope'],
		[msk, 0.02e6, 'density'],
		[msk, 0.0201e6, 'envelope'],
		[pulsed, 20e3, 'lines'],
		[pulsed, 20.1e3, 'pulses'],
		[fm, 199e3, 'lines'],
		[fm, 200e3, 'quasi-static'],
		[{ ...fm, deviationHz: 50e3 }, 3e6, 'lines'],
		[{ kind: 'pm', ...carrier, modulatingHz: 1e3, deviationRad: 150 }, 200e3, 'quasi-static'],
		[{ kind: 'am', ...carrier, modulatingHz: 1, depth: 0.5 }, 3e6, 'lines'],
		[{ kind: 'cw', ...carrier }, 3e6, 'lines'],
		[{ kind: 'multicarrier', ...carrier, subcarriers: 64, spacingHz: 15e3 }, 3e6, 'density'],
		[{ kind: 'noise', densityDbmPerHz: -100, startHz: 1e6, stopHz: 2e6 }, 3e6, 'density']
	])('%j through %f Hz acts as %s', (emitter, rbwHz, expected) =>
		expect(kindOf(emitter).behaviour(emitter, rbwHz)).toBe(expected)
	);
});

describe('lines(emitter, phases)', () => {
	const level = fc.double({ min: -100, max: 20, noNaN: true });
	it('of FM, PM and AM hold the mean power, whatever index and phases', () =>
		fc.assert(
			fc.property(
				fc.constantFrom<'fm' | 'pm' | 'am'>('fm', 'pm', 'am'),
				level,
				fc.double({ min: 0, max: 60, noNaN: true }),
				fc.double({ min: 0, max: 6.3, noNaN: true }),
				(kind, levelDbm, index, phase) => {
					const common = { frequencyHz: 1e9, levelDbm, modulatingHz: 1e3 };
					const emitter: Emitter =
						kind === 'am'
							? { kind, ...common, depth: index / 60 }
							: kind === 'fm'
								? { kind, ...common, deviationHz: index * 1e3 }
								: { kind, ...common, deviationRad: index };
					const lines = kindOf(emitter).lines!(emitter, { carrierRad: phase, modulationRad: 2 * phase });
					const sum = lines.reduce((total, line) => total + line.re ** 2 + line.im ** 2, 0);
					expect(sum / kindOf(emitter).meanPowerMw(emitter)).toBeCloseTo(1, 9);
				}
			),
			{ numRuns: 60 }
		));

	/** The complex envelope that lines add up to, at `t` seconds. */
	const envelopeAt = (emitter: Emitter, t: number) => {
		const lines = kindOf(emitter).lines!(emitter, phases, { startHz: 0.8e9, stopHz: 1.2e9 });
		let re = 0;
		let im = 0;
		for (const line of lines) {
			const turn = 2 * Math.PI * (line.frequencyHz - 1e9) * t;
			re += line.re * Math.cos(turn) - line.im * Math.sin(turn);
			im += line.re * Math.sin(turn) + line.im * Math.cos(turn);
		}
		return { power: re * re + im * im, phase: Math.atan2(im, re) };
	};
	const turnTo = (a: number, b: number) => Math.cos(a - b);

	it('of FM add up to the stated phase, carrier plus β·sin θ, at constant power', () => {
		const emitter: Emitter = { ...fm, deviationHz: 4e3 };
		for (const t of [0, 1.3e-4, 7.7e-4]) {
			const { power, phase } = envelopeAt(emitter, t);
			const theta = 2 * Math.PI * 1e3 * t + phases.modulationRad;
			expect(power).toBeCloseTo(levelMw, 6);
			expect(turnTo(phase, phases.carrierRad + 4 * Math.sin(theta))).toBeCloseTo(1, 8);
		}
	});
	it('of PM add up to carrier plus Δφ·cos θ, of AM to an envelope of 1 + depth·cos θ', () => {
		const pm: Emitter = { kind: 'pm', ...carrier, modulatingHz: 1e3, deviationRad: 3 };
		const am: Emitter = { kind: 'am', ...carrier, modulatingHz: 1e3, depth: 0.6 };
		for (const t of [0, 1.3e-4, 7.7e-4]) {
			const theta = 2 * Math.PI * 1e3 * t + phases.modulationRad;
			expect(turnTo(envelopeAt(pm, t).phase, phases.carrierRad + 3 * Math.cos(theta))).toBeCloseTo(1, 8);
			expect(envelopeAt(am, t).power).toBeCloseTo(levelMw * (1 + 0.6 * Math.cos(theta)) ** 2, 9);
		}
	});
	it('of a pulse train add up to the pulse where its phase says, and to nothing between', () => {
		const middleS = (-phases.modulationRad / (2 * Math.PI)) * pulsed.periodS + pulsed.periodS;
		expect(envelopeAt(pulsed, middleS).power).toBeCloseTo(levelMw, 3);
		expect(envelopeAt(pulsed, middleS + 0.3e-6).power).toBeCloseTo(levelMw, 3);
		expect(envelopeAt(pulsed, middleS + 0.8e-6).power).toBeLessThan(1e-4 * levelMw);
		expect(envelopeAt(pulsed, middleS + 40e-6).power).toBeLessThan(1e-6 * levelMw);
	});
	it('inside a band are just those of all that lie in it', () => {
		const band = { startHz: 1e9 - 2.5e3, stopHz: 1e9 + 7e3 };
		const all = kindOf(fm).lines!(fm, phases);
		const some = kindOf(fm).lines!(fm, phases, band);
		expect(some).toEqual(all.filter((l) => l.frequencyHz >= band.startHz && l.frequencyHz <= band.stopHz));
		expect(some.length).toBeGreaterThan(0);
	});
	it('of a carrier with phase noise keep exp(−σ²): the rest is its skirts’, and both together are the level', () => {
		const phaseNoise = [{ offsetHz: 1e4, dbcPerHz: -70 }];
		const cw: Emitter = { kind: 'cw', ...carrier, phaseNoise };
		const [line] = kindOf(cw).lines!(cw, phases);
		const variance = 2 * 1e-7 * 1e5;
		expect((line.re ** 2 + line.im ** 2) / levelMw).toBeCloseTo(Math.exp(-variance), 12);
		const skirts = phaseNoiseDensity(1e9, levelMw, phaseNoise);
		expect(line.re ** 2 + line.im ** 2 + skirts.powerMw).toBeCloseTo(levelMw, 12);
	});
});

describe('density(emitter)', () => {
	const densities: [string, Density][] = (
		[
			digital,
			{ ...digital, rollOff: 1, order: 16 },
			msk,
			{ ...msk, bt: 0.3 },
			{ ...msk, bt: 0.5 },
			{ kind: 'multicarrier', ...carrier, subcarriers: 64, spacingHz: 15e3 },
			{ kind: 'multicarrier', ...carrier, subcarriers: 3, spacingHz: 300e3 },
			{ kind: 'noise', densityDbmPerHz: -70, startHz: 999.5e6, stopHz: 1000.5e6 }
		] as Emitter[]
	).map((emitter) => [JSON.stringify(emitter), kindOf(emitter).density!(emitter)]);
	densities.push([
		'phase noise',
		phaseNoiseDensity(1e9, 0.1, [
			{ offsetHz: 1e4, dbcPerHz: -92 },
			{ offsetHz: 1e5, dbcPerHz: -92 },
			{ offsetHz: 1e6, dbcPerHz: -112 }
		])
	]);
	const spot = fc.double({ min: -1.4e6, max: 1.4e6, noNaN: true });

	it.each(densities)('%s: the share below rises, from 0 to 1', (_, density) => {
		fc.assert(
			fc.property(spot, spot, (a, b) => {
				const [low, high] = [1e9 + Math.min(a, b), 1e9 + Math.max(a, b)];
				// But for rounding.
				expect(density.cumulative(high)).toBeGreaterThanOrEqual(density.cumulative(low) - 1e-12);
				expect(density.cumulative(low)).toBeGreaterThanOrEqual(0);
				expect(density.cumulative(high)).toBeLessThanOrEqual(1);
			})
		);
	});
	it.each(densities)('%s: its density is the slope of the share below', (_, density) => {
		fc.assert(
			fc.property(spot, (offsetHz) => {
				const frequencyHz = 1e9 + offsetHz;
				const step = 10;
				fc.pre(density.breaksHz.every((edge) => Math.abs(edge - frequencyHz) > 2 * step));
				const slope =
					(density.powerMw *
						(density.cumulative(frequencyHz + step) - density.cumulative(frequencyHz - step))) /
					(2 * step);
				const top = density.powerMw / 1e6;
				expect(Math.abs(slope - density.densityMwPerHz(frequencyHz))).toBeLessThan(2e-5 * top);
			})
		);
	});
	it.each(densities)('%s: all but 1e-9 lies in the support (1e-5 of a multicarrier’s)', (name, density) => {
		const outside = density.cumulative(density.startHz) + 1 - density.cumulative(density.stopHz);
		expect(outside).toBeLessThan(name.includes('multicarrier') ? 1e-5 : 1e-9);
	});
	it('a multicarrier has a gap in the middle: no subcarrier on the centre', () => {
		const [, density] = densities[5];
		expect(density.densityMwPerHz(1e9)).toBeLessThan(1e-12 * density.densityMwPerHz(1e9 + 15e3));
	});
});
