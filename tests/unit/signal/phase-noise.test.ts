import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integratedPhaseNoise, phaseNoiseAt, phaseNoiseIntegral } from '$lib/server/bench/signal/phase-noise';

const points = [
	{ offsetHz: 1e3, dbcPerHz: -80 },
	{ offsetHz: 1e4, dbcPerHz: -90 },
	{ offsetHz: 1e5, dbcPerHz: -120 }
];
const db = (offsetHz: number) => 10 * Math.log10(phaseNoiseAt(points, offsetHz));

describe('phaseNoiseAt(points, offsetHz)', () => {
	it.each([
		[0, -80],
		[500, -80],
		[1e3, -80],
		[10 ** 3.5, -85],
		[1e4, -90],
		[10 ** 4.5, -105],
		[1e5, -120],
		[9.9e5, -120]
	])('at %f Hz is %f dBc/Hz: level, straight over log offset, level again', (offsetHz, dbc) =>
		expect(db(offsetHz)).toBeCloseTo(dbc, 9)
	);
	it('is nothing beyond ten times the last offset', () => expect(phaseNoiseAt(points, 1.0001e6)).toBe(0));
});

describe('phaseNoiseIntegral(points)', () => {
	it('rises by L times the step, whatever the slopes (−10 dB a decade included)', () => {
		const table = fc
			.array(
				fc.tuple(
					fc.double({ min: 1.2, max: 30, noNaN: true }),
					fc.double({ min: -150, max: -60, noNaN: true })
				),
				{
					minLength: 1,
					maxLength: 6
				}
			)
			.map((steps) => {
				let offsetHz = 100;
				return steps.map(([ratio, dbcPerHz]) => ({ offsetHz: (offsetHz *= ratio), dbcPerHz }));
			});
		fc.assert(
			fc.property(table, fc.double({ min: 1, max: 7, noNaN: true }), (random, decades) => {
				const f = 10 ** decades;
				const edges = [...random.map((p) => p.offsetHz), 10 * random[random.length - 1].offsetHz];
				fc.pre(edges.every((edge) => Math.abs(f / edge - 1) > 2e-4));
				const integral = phaseNoiseIntegral(random);
				const mean = (integral(f * (1 + 1e-4)) - integral(f * (1 - 1e-4))) / (2e-4 * f);
				expect(Math.abs(mean - phaseNoiseAt(random, f))).toBeLessThanOrEqual(
					1e-4 * phaseNoiseAt(random, f) + 1e-10 * (integral(Infinity) / f)
				);
			})
		);
		const tenPerDecade = phaseNoiseIntegral(points.slice(0, 2));
		expect(tenPerDecade(1e4) - tenPerDecade(1e3)).toBeCloseTo(1e-8 * 1e3 * Math.log(10), 12);
	});
	it('stops where L stops', () => {
		const integral = phaseNoiseIntegral(points);
		expect(integral(1e9)).toBe(integral(1e6));
		expect(integral(0)).toBe(0);
	});
});

describe('integratedPhaseNoise(points, field?)', () => {
	it('refuses more than 0.1 rad² by the name of the field, and takes a little less', () => {
		const flat = (dbcPerHz: number) => [{ offsetHz: 1e3, dbcPerHz }];
		// 2·10⁴ Hz times L: −53.01 dBc/Hz makes 0.1.
		expect(integratedPhaseNoise(flat(-53.02))).toBeCloseTo(0.0998, 4);
		expect(() => integratedPhaseNoise(flat(-53), 'scene.emitters.2.phaseNoise')).toThrow(
			expect.objectContaining({
				field: 'scene.emitters.2.phaseNoise',
				message: expect.stringContaining('0.1')
			})
		);
	});
});
