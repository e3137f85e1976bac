import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { readers } from '$lib/measure/readers';
import type { ReadingRequest } from '$lib/measure/reading-request';
import { takeReading } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';
import { buildNoise, buildTrace } from '../../factories/trace';

// Many seeds: seconds on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

const requests: ReadingRequest[] = [
	{ kind: 'marker', atHz: 100e6 },
	{ kind: 'marker', atS: 1e-4 },
	{ kind: 'delta', fromHz: 99.9e6, toHz: 100.1e6 },
	{ kind: 'peak' },
	{ kind: 'next-peak', fromHz: 100e6, side: 'lower' },
	{ kind: 'minimum' },
	{ kind: 'noise-density', atHz: 100e6 },
	{ kind: 'band-power', startHz: 99.9e6, stopHz: 100e6 },
	{ kind: 'channel-power', centreHz: 100e6, widthHz: 300e3 },
	{ kind: 'power-density', centreHz: 100e6, widthHz: 1 },
	{ kind: 'occupied-bandwidth', percent: 99 },
	{ kind: 'occupied-bandwidth', percent: 99, centreHz: 100e6, widthHz: 100 },
	{ kind: 'x-db-bandwidth', db: 26 },
	{
		kind: 'adjacent-channel',
		centreHz: 100e6,
		widthHz: 100e3,
		offsets: [{ offsetHz: 200e3, widthHz: 100e3 }]
	},
	{
		kind: 'adjacent-channel',
		centreHz: 100e6,
		widthHz: 100e3,
		offsets: [{ offsetHz: 450e3, widthHz: 100e3 }],
		rrcRollOff: 0.22
	},
	{ kind: 'harmonics', fundamentalHz: 50e6, count: 3 },
	{ kind: 'thd', fundamentalHz: 99.6e6, count: 3 },
	{ kind: 'intercept', lowerHz: 99.9e6, upperHz: 100.1e6 },
	{ kind: 'carrier-to-noise', carrierHz: 100e6, widthHz: 100e3, noiseHz: 100.3e6 },
	{ kind: 'phase-noise', carrierHz: 100e6, offsetHz: 100e3 },
	{ kind: 'am-depth', carrierHz: 100e6 },
	{ kind: 'fm-deviation', carrierHz: 100e6 },
	{ kind: 'pulse', carrierHz: 100e6 },
	{ kind: 'time' },
	{ kind: 'mask', limits: [{ startHz: 99e6, stopHz: 101e6, levelDbm: -50 }] }
];

const anyTrace: fc.Arbitrary<Trace> = fc
	.record({
		spanHz: fc.constantFrom(0, 1e3, 1e6, 200e6),
		rbwHz: fc.constantFrom(1, 1e3, 10e3, 3e6),
		vbwHz: fc.constantFrom(undefined, 10, 30e3),
		sweepTimeS: fc.constantFrom(undefined, 1e-3, 1, 2000),
		detector: fc.constantFrom('rise-fall', 'positive-peak', 'negative-peak', 'sample', 'average'),
		scale: fc.constantFrom('log', 'power', 'voltage'),
		mode: fc.constantFrom(undefined, 'live', 'max-hold', 'min-hold', 'average', 'kept'),
		count: fc.constantFrom(undefined, 1, 1000),
		levelsDbm: fc.oneof(
			fc.array(fc.double({ min: -1000, max: 1000, noNaN: true }), { minLength: 2, maxLength: 60 }),
			fc.array(fc.double({ min: -120, max: 20, noNaN: true }), { minLength: 2, maxLength: 200 }),
			// Few different levels: bursts, ties, edges at the ends.
			fc.array(fc.constantFrom(-90, -38, -27, -25, -21, -20.5, -20), { minLength: 2, maxLength: 40 }),
			fc
				.tuple(fc.integer({ min: 2, max: 101 }), fc.double({ min: -200, max: 50, noNaN: true }))
				.map(([points, level]) => Array<number>(points).fill(level))
		)
	})
	.map(
		({ spanHz, ...rest }) => ({ startHz: 100e6 - spanHz / 2, stopHz: 100e6 + spanHz / 2, ...rest }) as Trace
	);

describe('takeReading(trace, request)', () => {
	it('names every kind in this file', () =>
		expect(new Set(requests.map(({ kind }) => kind))).toEqual(new Set(Object.keys(readers))));

	it.each(requests.map((request) => [request.kind, request] as const))(
		'gives a finite number with a spread, or a problem with what it needs, for any trace: %s',
		(kind, request) =>
			fc.assert(
				fc.property(anyTrace, (trace) => {
					const outcome = takeReading(trace, request);
					expect(outcome.kind).toBe(kind);
					if ('problem' in outcome) {
						expect(outcome.problem.length * outcome.needs.length).toBeGreaterThan(0);
						return;
					}
					expect(Number.isFinite(outcome.value)).toBe(true);
					expect(Number.isFinite(outcome.spread) && outcome.spread >= 0).toBe(true);
					// A part that has no number is left out; JSON would turn NaN into null.
					expect(JSON.stringify(outcome)).not.toContain('null');
					expect(outcome.remarks.every(({ text }) => text.endsWith('.') && !/NaN|Infinity/.test(text))).toBe(
						true
					);
				}),
				{ numRuns: 60 }
			)
	);

	it.each([NaN, -Infinity, Infinity])(
		'refuses a trace that holds %d, as one still being swept does',
		(level) => {
			const trace = buildTrace({}, (frequencyHz) => (frequencyHz > 100.2e6 ? level : -50));
			expect(takeReading(trace, { kind: 'peak' })).toMatchObject({ kind: 'peak', needs: 'a finished sweep' });
		}
	);
	it('refuses a trace without a sweep', () =>
		expect(takeReading({ ...buildTrace({}, () => 0), levelsDbm: [] }, { kind: 'peak' })).toHaveProperty(
			'problem'
		));

	it('reads the same from single and double precision, to a thousandth of a decibel', () => {
		const trace = buildNoise('precision', { rbwHz: 10e3, rows: 3 }, -140);
		const doubles = { ...trace, levelsDbm: Array.from(trace.levelsDbm) };
		const request = { kind: 'channel-power', centreHz: 100e6, widthHz: 300e3 } as const;
		const values = [trace, doubles]
			.map((t) => takeReading(t, request))
			.map((r) => ('value' in r ? r.value : NaN));
		expect(values[0]).toBeCloseTo(values[1], 3);
	});
});
