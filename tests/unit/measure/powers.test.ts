import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { Trace } from '$lib/measure/trace';
import {
	buildDensity,
	buildLines,
	buildNoise,
	buildTrace,
	overSeeds,
	raisedCosineDensity
} from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

// Many seeds: seconds on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

const channel = { kind: 'channel-power', centreHz: 100e6, widthHz: 0.4e6 } as const;
const zeroSpan = buildTrace({ startHz: 100e6, stopHz: 100e6, sweepTimeS: 1e-3 }, () => -50);

describe('channel-power {centreHz, widthHz}', () => {
	it('gives back the power of a line within 0.01 dB, wherever it falls between the points', () =>
		fc.assert(
			fc.property(fc.double({ min: 99.9e6, max: 100.1e6, noNaN: true }), (frequencyHz) => {
				const trace = buildLines({ rbwHz: 3e3 }, [{ frequencyHz, levelDbm: -33 }], -180);
				expect(readOff(trace, channel).value).toBeCloseTo(-33, 2);
			}),
			{ numRuns: 30 }
		));
	it('gives back the power of a root-raised-cosine signal within 0.01 dB', () => {
		const trace = buildDensity({ rbwHz: 3e3 }, -21, raisedCosineDensity(100e6, 300e3, 0.22));
		expect(readOff(trace, channel).value).toBeCloseTo(-21, 2);
	});
	it('takes the fraction of a cell that lies inside', () => {
		const flat = buildTrace({ rbwHz: 2e3 }, () => -80);
		const of = (widthHz: number) => readOff(flat, { ...channel, widthHz }).value;
		expect(of(100_500) - of(100_000)).toBeCloseTo(10 * Math.log10(1.005), 9);
	});
	it('adds what every point adds: 3 dB more everywhere is 3 dB more', () =>
		fc.assert(
			fc.property(fc.double({ min: -60, max: 60, noNaN: true }), fc.string(), (shiftDb, seed) => {
				const trace = buildNoise(seed, { rbwHz: 10e3, points: 201 }, -140);
				const shifted = { ...trace, levelsDbm: Array.from(trace.levelsDbm, (level) => level + shiftDb) };
				expect(readOff(shifted, channel).value - readOff(trace, channel).value).toBeCloseTo(shiftDb, 9);
			}),
			{ numRuns: 30 }
		));
	it('makes no difference between one band and the two halves of it', () => {
		const trace = buildNoise('halves', { rbwHz: 10e3 }, -140);
		const mw = (startHz: number, stopHz: number) =>
			10 ** (readOff(trace, { kind: 'band-power', startHz, stopHz }).value / 10);
		expect(mw(99.7e6, 99.91234e6) + mw(99.91234e6, 100.2e6)).toBeCloseTo(mw(99.7e6, 100.2e6), 20);
	});
	it('is unbiased on noise when the average is one of power, 2.5 dB low when it is one of dB', () => {
		const of = (scale: Trace['scale']) =>
			overSeeds(
				20,
				(seed) =>
					readOff(buildNoise(seed, { rbwHz: 10e3, points: 301, rows: 50, scale }, -140), channel).value
			).mean;
		const trueDbm = -140 + 10 * Math.log10(0.4e6);
		expect(Math.abs(of('power') - trueDbm)).toBeLessThan(0.05);
		// What is left of the scatter after 50 rows, 0.788 dB and 0.642 dB, lifts a mean of powers by (ln 10/20)·σ².
		expect(Math.abs(of('log') - (trueDbm - 2.507 + 0.0715))).toBeLessThan(0.05);
		expect(Math.abs(of('voltage') - (trueDbm - 1.049 + 0.0475))).toBeLessThan(0.05);
	});
	it('reads what the trace holds of a channel that reaches beyond it, and says so', () => {
		const flat = buildTrace({ rbwHz: 2e3 }, () => -80);
		const cut = readOff(flat, { ...channel, centreHz: 100.5e6 });
		expect(codesOf(cut)).toContain('window-outside-span');
		expect(codesOf(readOff(flat, { ...channel, widthHz: 1e6 }))).not.toContain('window-outside-span');
		expect(problemOf(flat, { ...channel, centreHz: 102e6 }).problem).toContain('outside the trace');
	});
	it('has no number in span 0', () => expect(problemOf(zeroSpan, channel).needs).toBe('a span above 0'));

	const noise = (setup: Partial<Trace> & { rows?: number; points?: number }) =>
		buildNoise('remarks', { rbwHz: 10e3, ...setup }, -140);
	it.each<[string, Trace, string[]]>([
		['an average of power', noise({ scale: 'power', rows: 10 }), []],
		['a single sweep on the log scale', noise({}), []],
		['an average of dB', noise({ rows: 10 }), ['not-a-power-scale']],
		['an average of voltage', noise({ scale: 'voltage', rows: 10 }), ['not-a-power-scale']],
		[
			'a narrow video filter on the log scale',
			{ ...noise({ rows: 60 }), mode: 'live', vbwHz: 100, sweepTimeS: 10 },
			['not-a-power-scale']
		],
		['a peak detector', noise({ detector: 'positive-peak' }), ['detector-peak-on-noise']],
		['the rise-fall detector', noise({ detector: 'rise-fall' }), ['detector-peak-on-noise']],
		['a minimum detector', noise({ detector: 'negative-peak' }), ['detector-minimum']],
		['a maximum hold', noise({ mode: 'max-hold', rows: 10 }), ['held-noise']],
		['points more than B/2 apart', noise({ points: 101, sweepTimeS: 0.1 }), ['too-few-points']],
		['a filter wider than a twentieth', noise({ rbwHz: 30e3 }), ['rbw-too-wide']]
	])('remarks on %s', (_, trace, codes) => expect(codesOf(readOff(trace, channel))).toEqual(codes));

	it('remarks nothing about scale or detector on a clean line, where they make no difference', () => {
		const trace = buildLines(
			{ rbwHz: 10e3, detector: 'positive-peak', mode: 'average', count: 10 },
			[{ frequencyHz: 100e6, levelDbm: -30 }],
			-120
		);
		const reading = readOff(trace, channel);
		expect(codesOf(reading)).toEqual([]);
		expect(reading.spread).toBeLessThan(0.02);
	});
});

describe('power-density {centreHz, widthHz}', () => {
	it('is the channel power over the width', () => {
		const trace = buildTrace({ rbwHz: 2e3 }, () => -80);
		const { value, unit } = readOff(trace, { ...channel, kind: 'power-density' });
		expect(value).toBeCloseTo(readOff(trace, channel).value - 10 * Math.log10(0.4e6), 9);
		expect(unit).toBe('dBm/Hz');
	});
});

describe('noise-density {atHz}', () => {
	it.each(['log', 'power', 'voltage'] as const)('is unbiased within 0.03 dB on the %s scale', (scale) => {
		// Span 0, so that all points count: 300 000 values, 0.010 dB on the log scale.
		const setup = { startHz: 100e6, stopHz: 100e6, rbwHz: 10e3, sweepTimeS: 0.4, rows: 30, scale };
		const request = { kind: 'noise-density', atHz: 100e6 } as const;
		const { mean } = overSeeds(10, (seed) => readOff(buildNoise(seed, setup, -140), request).value);
		expect(Math.abs(mean + 140)).toBeLessThan(0.03);
	});
	it('averages what lies within 2.5 % of the span and nothing else', () => {
		const step = buildTrace({}, (frequencyHz) => (Math.abs(frequencyHz - 100e6) < 25.4e3 ? -80 : 0));
		const flat = buildTrace({}, () => -80);
		const request = { kind: 'noise-density', atHz: 100e6 } as const;
		expect(readOff(step, request).value).toBeCloseTo(readOff(flat, request).value, 9);
	});
	it('says when a line stands in the window, and not when there is noise alone', () => {
		const request = { kind: 'noise-density', atHz: 100e6 } as const;
		const line = (frequencyHz: number) => (Math.abs(frequencyHz - 100e6) < 2e3 ? -70 : -300);
		for (const rows of [1, 30]) {
			const noise = buildNoise('window', { rbwHz: 10e3, rows }, -140);
			expect(codesOf(readOff(noise, request))).toEqual([]);
			const both = buildNoise('window', { rbwHz: 10e3, rows }, -140, line);
			expect(codesOf(readOff(both, request))).toEqual(['signal-in-window']);
		}
	});
	it('takes every point in span 0, where all stand at one frequency', () => {
		expect(readOff(zeroSpan, { kind: 'noise-density', atHz: 100e6 }).value).toBeCloseTo(
			-50 + 2.50682 - 10 * Math.log10(1.064467e4),
			4
		);
		expect(problemOf(zeroSpan, { kind: 'noise-density', atHz: 90e6 }).problem).toContain('outside');
	});
});

describe('carrier-to-noise {carrierHz, widthHz, noiseHz}', () => {
	const request = { kind: 'carrier-to-noise', carrierHz: 100e6, noiseHz: 100.35e6 } as const;
	it.each(['log', 'power'] as const)(
		'is carrier over noise in the width, for a line, on the %s scale',
		(scale) => {
			const line = buildLines({ rbwHz: 3e3 }, [{ frequencyHz: 100e6, levelDbm: -60 }], -300);
			const { mean } = overSeeds(20, (seed) => {
				const noise = buildNoise(seed, { rbwHz: 3e3, rows: 20, scale }, -140);
				const levelsDbm = Array.from(
					noise.levelsDbm,
					(level, i) => 10 * Math.log10(10 ** (level / 10) + 10 ** (line.levelsDbm[i] / 10))
				);
				return readOff({ ...noise, levelsDbm }, { ...request, widthHz: 100e3 }).value;
			});
			expect(Math.abs(mean - 30)).toBeLessThan(0.1);
		}
	);
	it('takes the top of the line when the width is not three times the filter', () => {
		const trace = buildLines({ rbwHz: 10e3, scale: 'power' }, [{ frequencyHz: 100e6, levelDbm: -40 }], -110);
		const { value, parts } = readOff(trace, { ...request, widthHz: 1e3 });
		expect(parts?.carrierDbm).toBeCloseTo(-40, 3);
		expect(value).toBeCloseTo(-40 - (-110 - 10 * Math.log10(10.64467)), 3);
	});
	it('takes noise off a weak carrier, and has no number when nothing is left', () => {
		const trace = buildLines({ rbwHz: 3e3, scale: 'power' }, [{ frequencyHz: 100e6, levelDbm: -100 }], -110);
		expect(readOff(trace, { ...request, widthHz: 30e3 }).parts?.carrierDbm).toBeCloseTo(-100, 2);
		const flat = buildTrace({ rbwHz: 3e3, scale: 'power' }, (frequencyHz) =>
			frequencyHz > 100.3e6 ? -100 : -101
		);
		expect(problemOf(flat, { ...request, widthHz: 30e3 }).problem).toContain('No carrier');
	});
});
