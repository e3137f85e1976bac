import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BenchError } from '$lib/server/bench/bench-error';
import { sweepCommand } from '$lib/server/bench/commands/sweep-command';
import { ideal, meanPowerDbm, sweep } from '../../reference/bench-on-paper';

const detectors = ['rise-fall', 'positive-peak', 'negative-peak', 'sample', 'average'] as const;
const scales = ['log', 'power', 'voltage'] as const;
const carrier = { kind: 'cw' as const, frequencyHz: 1e9, levelDbm: -30 };
const emitter = fc.oneof(
	fc.constant(carrier),
	fc.constant({
		kind: 'digital' as const,
		frequencyHz: 1e9,
		levelDbm: -25,
		symbolRateHz: 1e5,
		rollOff: 0.35,
		order: 16 as const
	}),
	fc.constant({ kind: 'msk' as const, frequencyHz: 1e9, levelDbm: -25, bitRateHz: 2e5, bt: 0.3 }),
	fc.constant({ kind: 'fm' as const, frequencyHz: 1e9, levelDbm: -25, modulatingHz: 50, deviationHz: 75e3 }),
	fc.constant({ kind: 'am' as const, frequencyHz: 1e9, levelDbm: -25, modulatingHz: 1e3, depth: 1 }),
	fc.constant({ kind: 'pulsed' as const, frequencyHz: 1e9, levelDbm: -20, widthS: 1e-6, periodS: 1.3e-3 }),
	fc.constant({ ...carrier, gate: { onS: 0.003, offS: 0.02 } }),
	fc.constant({ ...carrier, hop: { channelsHz: [0.9997e9, 1e9, 1.0004e9], dwellS: 0.004 } }),
	fc.constant({ ...carrier, drift: { hzPerS: 3e4 } }),
	fc.constant({ kind: 'noise' as const, densityDbmPerHz: -110, startHz: 0.9998e9, stopHz: 1.0001e9 }),
	fc.constant({
		kind: 'multicarrier' as const,
		frequencyHz: 1e9,
		levelDbm: -20,
		subcarriers: 16,
		spacingHz: 15e3
	})
);
const anySettings = fc.record({
	spanHz: fc.constantFrom(0, 1e5, 1e6, 3e7),
	rbwHz: fc.constantFrom(1e3, 1e4, 1e5, 1e6),
	vbwOverRbw: fc.constantFrom(0.003, 0.05, 0.3, 3, 30),
	sweepTimeS: fc.constantFrom(0.001, 0.02, 0.5, 20),
	points: fc.constantFrom(101, 201),
	detector: fc.constantFrom(...detectors),
	scale: fc.constantFrom(...scales)
});

describe('a sweep of whatever scene with whatever settings', () => {
	it('gives one finite level a point, and the same bytes again', () => {
		fc.assert(
			fc.property(
				fc.array(emitter, { maxLength: 3 }),
				anySettings,
				fc.nat(),
				(emitters, { vbwOverRbw, ...rest }, seed) => {
					const input = {
						scene: { emitters },
						receiver: 'field',
						settings: { centreHz: 1e9, vbwHz: vbwOverRbw * rest.rbwHz, ...rest },
						seed,
						sweeps: 2
					};
					const result = sweepCommand(input);
					for (const row of result.levelsDbm) {
						expect(row).toHaveLength(rest.points);
						expect(row.every((level) => Number.isFinite(level) && level > -450 && level < 60)).toBe(true);
					}
					expect(sweepCommand(input)).toEqual(result);
				}
			),
			{ numRuns: 40, seed: 11 }
		);
	}, 240_000);

	it('never clamps: a setting outside its limits is refused by the name it was typed under', () => {
		const bad = fc.constantFrom<[object, string]>(
			[{ rbwHz: 12e3 }, 'rbwHz'],
			[{ attenuationDb: 7 }, 'attenuationDb'],
			[{ sweepTimeS: 5000 }, 'sweepTimeS'],
			[{ points: 50 }, 'settings.points'],
			[{ centreHz: 1e9, startHz: 1e8 }, 'startHz'],
			[{ centreHz: 9e9, spanHz: 1e6 }, 'centreHz'],
			[{ vbwHz: -1 }, 'settings.vbwHz'],
			[{ colour: 'red' }, 'settings.colour']
		);
		fc.assert(
			fc.property(bad, ([settings, field]) => {
				try {
					sweepCommand({ scene: { emitters: [] }, settings });
				} catch (error) {
					expect(error).toBeInstanceOf(BenchError);
					expect((error as BenchError).field).toContain(field.split('.').pop());
					return;
				}
				expect.unreachable(`${field} was accepted`);
			})
		);
	});
});

describe('physics that holds for any settings', () => {
	it('incoherent powers add before an ideal front end', () => {
		const settings = {
			centreHz: 1e9,
			spanHz: 2e6,
			rbwHz: 30e3,
			vbwHz: 10e6,
			detector: 'average' as const,
			scale: 'power' as const,
			points: 401
		};
		const band = (densityDbmPerHz: number) => ({
			kind: 'noise' as const,
			densityDbmPerHz,
			startHz: 0.9985e9,
			stopHz: 1.0015e9
		});
		const power = (emitters: ReturnType<typeof band>[], seed: number) =>
			meanPowerDbm(sweep({ emitters, settings, seed, sweeps: 30 }).levelsDbm.flat());
		fc.assert(
			fc.property(
				fc.double({ min: -120, max: -90, noNaN: true }),
				fc.double({ min: -6, max: 6, noNaN: true }),
				fc.nat(1000),
				(level, apart, seed) => {
					const together = power([band(level), band(level + apart)], seed);
					const sum =
						10 * Math.log10(10 ** (level / 10) + 10 ** ((level + apart) / 10)) +
						10 * Math.log10(1.064467 * 30e3);
					expect(Math.abs(together - sum)).toBeLessThan(0.15);
				}
			),
			{ numRuns: 12, seed: 5 }
		);
	});

	it('more attenuation always raises the floor, on both receivers', () => {
		const floor = (receiver: 'field' | 'modest', attenuationDb: number, seed: number) =>
			meanPowerDbm(
				sweepCommand({
					scene: { emitters: [] },
					receiver,
					settings: {
						centreHz: 1.3e9,
						spanHz: 1e6,
						rbwHz: 1e4,
						vbwHz: 1e6,
						detector: 'average',
						scale: 'power',
						attenuationDb
					},
					seed,
					sweeps: 10
				}).levelsDbm.flat()
			);
		fc.assert(
			fc.property(
				fc.constantFrom('field' as const, 'modest' as const),
				fc.constantFrom(0, 5, 10, 15, 20, 30, 40),
				fc.nat(500),
				(receiver, db, seed) => {
					expect(floor(receiver, db + 10, seed) - floor(receiver, db, seed)).toBeGreaterThan(9.5);
				}
			),
			{ numRuns: 12, seed: 3 }
		);
	});

	it('a carrier caught only while it is on: a gate of 1 % shows in few sweeps of average, and in every hold', () => {
		const emitters = [{ ...carrier, gate: { onS: 0.002, offS: 0.198 } }];
		const settings = { centreHz: 1e9, spanHz: 1e6, detector: 'positive-peak' as const, points: 401 };
		const result = sweep({
			emitters,
			receiver: ideal,
			settings: { ...settings, traces: [{ mode: 'max-hold' }] },
			sweeps: 120
		});
		const caught = result.levelsDbm.filter((row) => Math.max(...row) > -50).length;
		expect(caught).toBeGreaterThan(0);
		expect(caught).toBeLessThan(60);
		expect(Math.max(...result.traces[0].levelsDbm)).toBeGreaterThan(-50);
	});

	it('residual responses stand where the profile says, whatever is connected, and rise with attenuation', () => {
		const at = (attenuationDb: number) =>
			Math.max(
				...sweepCommand({
					scene: { emitters: [] },
					receiver: { ...ideal, residuals: [{ frequencyHz: 1e9, levelDbm: -95 }] },
					settings: {
						centreHz: 1e9,
						spanHz: 1e5,
						rbwHz: 1e3,
						detector: 'positive-peak',
						attenuationDb,
						input: { connected: false }
					}
				}).levelsDbm[0]
			);
		expect(at(0)).toBeCloseTo(-95, 0);
		expect(at(20)).toBeCloseTo(-75, 0);
	});

	it('too much power trips the input: flags say so and there are no rows', () => {
		const result = sweepCommand({
			scene: { emitters: [{ ...carrier, levelDbm: 45 }] },
			receiver: 'field',
			settings: { centreHz: 1e9, spanHz: 1e6 }
		});
		expect(result.flags.map((flag) => flag.kind)).toContain('input-protection');
		expect(result.levelsDbm).toEqual([]);
	});
});
