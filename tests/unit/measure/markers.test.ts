import { describe, expect, it } from 'vitest';
import { buildLines, buildNoise, buildTrace, overSeeds } from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

const line = { frequencyHz: 100e6, levelDbm: -30 };
const trace = buildLines({ rbwHz: 10e3 }, [line, { frequencyHz: 100.2e6, levelDbm: -52 }]);
const overTime = buildTrace(
	{ startHz: 100e6, stopHz: 100e6, sweepTimeS: 1e-3, rbwHz: 100e3 },
	(timeS) => -50 + 1000 * timeS
);

describe('marker {atHz} or {atS}', () => {
	it('reads the point nearest to it and says where that is', () => {
		const reading = readOff(trace, { kind: 'marker', atHz: 100.0003e6 });
		expect(reading.value).toBeCloseTo(-30, 6);
		expect(reading.unit).toBe('dBm');
		expect(reading.parts?.frequencyHz).toBe(100e6);
	});
	it('stands on a time in span 0', () => {
		const reading = readOff(overTime, { kind: 'marker', atS: 0.5e-3 });
		expect(reading.value).toBeCloseTo(-49.5, 9);
		expect(reading.parts?.timeS).toBeCloseTo(0.5e-3, 12);
	});
	it('has no number outside the trace, or for the wrong axis', () => {
		expect(problemOf(trace, { kind: 'marker', atHz: 101e6 }).problem).toContain('outside the trace');
		expect(problemOf(overTime, { kind: 'marker', atHz: 100e6 }).needs).toContain('atS');
		expect(problemOf(overTime, { kind: 'marker', atS: 2e-3 }).problem).toContain('outside the trace');
		expect(problemOf(trace, { kind: 'marker', atS: 1e-4 }).needs).toContain('span 0');
	});
	it('is sure of a line and unsure of noise', () => {
		expect(readOff(trace, { kind: 'marker', atHz: 100e6 }).spread).toBeLessThan(0.02);
		const noise = buildNoise('noise', { rbwHz: 10e3 }, -140);
		const { spread } = readOff(noise, { kind: 'marker', atHz: 100e6 });
		expect(spread).toBeGreaterThan(4.5);
		expect(spread).toBeLessThan(6.5);
	});
	it('says of noise under a peak detector or a hold that it reads high', () => {
		const peaked = buildNoise('peaks', { rbwHz: 10e3, detector: 'positive-peak' }, -140);
		expect(codesOf(readOff(peaked, { kind: 'marker', atHz: 100e6 }))).toContain('detector-peak-on-noise');
		const held = buildNoise('held', { rbwHz: 10e3, mode: 'max-hold', rows: 10 }, -140);
		expect(codesOf(readOff(held, { kind: 'marker', atHz: 100e6 }))).toContain('held-noise');
		expect(codesOf(readOff(trace, { kind: 'marker', atHz: 100e6 }))).toEqual([]);
	});
	it('says when points lie too far apart for a detector that looks only at points', () => {
		const sparse = buildLines({ rbwHz: 10e3, points: 101 }, [line]);
		expect(codesOf(readOff(sparse, { kind: 'marker', atHz: 100e6 }))).toContain('too-few-points');
		const peaked = { ...sparse, detector: 'positive-peak' as const };
		expect(codesOf(readOff(peaked, { kind: 'marker', atHz: 100e6 }))).not.toContain('too-few-points');
	});
	it('says when the sweep was too fast, and how much a line lost', () => {
		// r = S/B² = 1: 0.3863 dB.
		const fast = { ...trace, sweepTimeS: 10e-3 };
		const { remarks } = readOff(fast, { kind: 'marker', atHz: 100e6 });
		expect(remarks.map(({ code }) => code)).toEqual(['sweep-too-fast']);
		expect(remarks[0].text).toContain('0.39 dB');
	});
});

describe('delta {fromHz, toHz}', () => {
	it('reads to − from, in level and in frequency', () => {
		const reading = readOff(trace, { kind: 'delta', fromHz: 100e6, toHz: 100.2e6 });
		expect(reading.value).toBeCloseTo(-22, 4);
		expect(reading.unit).toBe('dB');
		expect(reading.parts?.frequencyHz).toBeCloseTo(0.2e6, 6);
	});
	it('reads times in span 0', () => {
		const reading = readOff(overTime, { kind: 'delta', fromS: 0.2e-3, toS: 0.7e-3 });
		expect(reading.value).toBeCloseTo(0.5, 9);
		expect(reading.parts?.timeS).toBeCloseTo(0.5e-3, 12);
	});
	it('strays as both of its markers do', () => {
		const { deviation } = overSeeds(
			200,
			(seed) =>
				readOff(buildNoise(seed, { rbwHz: 10e3 }, -140), { kind: 'delta', fromHz: 99.7e6, toHz: 100.3e6 })
					.value
		);
		const noise = buildNoise('noise', { rbwHz: 10e3 }, -140);
		const { spread } = readOff(noise, { kind: 'delta', fromHz: 99.7e6, toHz: 100.3e6 });
		expect(spread / deviation).toBeGreaterThan(0.75);
		expect(spread / deviation).toBeLessThan(1.25);
	});
});

describe('peak, next-peak and minimum', () => {
	it('find the highest and the lowest point', () => {
		const peak = readOff(trace, { kind: 'peak' });
		expect(peak.value).toBeCloseTo(-30, 6);
		expect(peak.parts?.frequencyHz).toBe(100e6);
		expect(readOff(trace, { kind: 'minimum' }).value).toBeCloseTo(-120, 3);
	});
	it('find the next peak on the side asked for', () => {
		const next = readOff(trace, { kind: 'next-peak', fromHz: 100e6, side: 'upper' });
		expect(next.value).toBeCloseTo(-52, 3);
		expect(next.parts?.frequencyHz).toBeCloseTo(100.2e6, 3);
	});
	it('keep to threshold and excursion, and say what they were when nothing is left', () => {
		const request = { kind: 'next-peak', fromHz: 100e6, side: 'upper', thresholdDbm: -50 } as const;
		expect(problemOf(trace, request).problem).toContain('-50 dBm');
		expect(problemOf(trace, { kind: 'next-peak', fromHz: 100e6, side: 'lower' }).problem).toContain(
			'lower side'
		);
	});
	it.each([
		{ detector: 'sample' },
		{ detector: 'rise-fall' },
		{ detector: 'positive-peak' },
		{ detector: 'rise-fall', mode: 'max-hold', rows: 10 },
		{ detector: 'sample', mode: 'average', rows: 10 }
	] as const)('go past crests of the noise to the next line, for %o', (look) => {
		const nearby = (frequencyHz: number) => (Math.abs(frequencyHz - 100.3e6) < 600 ? -65 : -300);
		for (const seed of ['a', 'b', 'c', 'd']) {
			const noisy = buildNoise(`crests ${seed}`, { rbwHz: 10e3, ...look }, -140, nearby);
			const next = readOff(noisy, { kind: 'next-peak', fromHz: 99.7e6, side: 'upper' });
			expect(next.parts?.frequencyHz).toBeCloseTo(100.3e6, -4);
			const none = problemOf(noisy, { kind: 'next-peak', fromHz: 99.7e6, side: 'lower' });
			expect(none.problem).toContain('out of the trace and its noise');
		}
	});
	it('find crests of the noise too where the threshold lets them', () => {
		const noise = buildNoise('crests', { rbwHz: 10e3 }, -140);
		const request = { kind: 'next-peak', fromHz: 100e6, side: 'upper', thresholdDbm: -200 } as const;
		expect(Math.abs(readOff(noise, request).parts!.frequencyHz! - 100e6)).toBeLessThan(50e3);
	});
	it('warn when the highest point is at the end of the trace', () => {
		const edge = buildLines({ rbwHz: 10e3 }, [{ frequencyHz: 100.5e6, levelDbm: -30 }]);
		expect(codesOf(readOff(edge, { kind: 'peak' }))).toContain('peak-at-edge');
	});
});
