import { describe, expect, it, vi } from 'vitest';
import { averageSpreadDb, independentLag, isAveraged, noiseSpreadDb } from '$lib/measure/noise-statistics';
import { noiseShare } from '$lib/measure/noise-share';
import type { Trace } from '$lib/measure/trace';
import { buildLines, buildNoise, buildTrace, overSeeds } from '../../factories/trace';
import { readOff } from '../../factories/reading';

// Many seeds: seconds on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

const settings: Partial<Trace>[] = [
	{ detector: 'sample', scale: 'log' },
	{ detector: 'sample', scale: 'power' },
	{ detector: 'sample', scale: 'voltage' },
	{ detector: 'average', scale: 'power' },
	{ detector: 'positive-peak', scale: 'log' },
	{ detector: 'negative-peak', scale: 'log' }
];
const cases = settings.flatMap((setting) => [1, 20].map((rows) => ({ ...setting, rows })));

describe('noiseSpreadDb(trace, points)', () => {
	it.each(cases)('foretells how far one point strays: $detector, $scale, $rows rows', (setting) => {
		const trace = buildNoise('points', { rbwHz: 10e3, points: 5001, ...setting }, -140);
		const levels = Array.from(trace.levelsDbm);
		const mean = levels.reduce((a, b) => a + b, 0) / levels.length;
		const deviation = Math.sqrt(levels.reduce((sum, level) => sum + (level - mean) ** 2, 0) / levels.length);
		const ratio = noiseSpreadDb(trace, 1) / deviation;
		expect(ratio).toBeGreaterThan(0.85);
		expect(ratio).toBeLessThan(1.15);
	});
	it('falls with the root of the points and of the rows', () => {
		const trace = buildNoise('any', { rbwHz: 10e3, rows: 9 }, -140);
		expect(noiseSpreadDb(trace, 100) / noiseSpreadDb(trace, 25)).toBeCloseTo(0.5, 2);
		expect(noiseSpreadDb({ ...trace, count: 36 }, 25) / noiseSpreadDb(trace, 25)).toBeCloseTo(0.5, 2);
	});
	it('counts points closer together than 1/B by the time they take', () => {
		const trace = buildTrace({ scale: 'power', sweepTimeS: 10 }, () => -100);
		// 100 points in 1 s at B = 10 kHz are 100 values; in 1 ms, B·t = 10 gives 15 at most.
		expect(noiseSpreadDb(trace, 100)).toBeCloseTo(averageSpreadDb('power', 100), 1);
		const quick = { ...trace, sweepTimeS: 10e-3 };
		expect(noiseSpreadDb(quick, 100)).toBeCloseTo(averageSpreadDb('power', 15.05), 1);
	});
});

describe('isAveraged(trace)', () => {
	const plain: Trace = { ...buildTrace({}, () => -100), detector: 'sample' };
	it('knows a mean from a single value', () => {
		expect(isAveraged(plain)).toBe(false);
		expect(isAveraged({ ...plain, detector: 'average' })).toBe(true);
		expect(isAveraged({ ...plain, vbwHz: 300 })).toBe(true);
		expect(isAveraged({ ...plain, mode: 'average', count: 10 })).toBe(true);
		expect(isAveraged({ ...plain, mode: 'live', count: 10 })).toBe(false);
		expect(isAveraged({ ...plain, mode: 'max-hold', count: 10 })).toBe(false);
	});
});

describe('independentLag(trace)', () => {
	it('reaches 0.7/B, or 0.35/VBW where the video filter is slower, and an even number of points for rise-fall', () => {
		const trace = buildTrace({ sweepTimeS: 20e-3 }, () => -100); // Δt = 20 µs, B = 10 kHz
		expect(independentLag(trace)).toBe(4);
		expect(independentLag({ ...trace, vbwHz: 1e3 })).toBe(18);
		expect(independentLag({ ...trace, sweepTimeS: 1 })).toBe(1);
		expect(independentLag({ ...trace, sweepTimeS: 1, detector: 'rise-fall' })).toBe(2);
	});
});

describe('noiseShare(trace, from, to)', () => {
	it.each(cases)('is 1 on noise: $detector, $scale, $rows rows', (setting) => {
		const trace = buildNoise('share', { rbwHz: 10e3, ...setting }, -140);
		expect(noiseShare(trace, 0, 1000)).toBeGreaterThan(0.9);
	});
	it.each([2.5e3, 100e3])(
		'is next to nothing on a clean line, points resolved or not (RBW %d Hz)',
		(rbwHz) => {
			const trace = buildLines({ rbwHz }, [{ frequencyHz: 100e6, levelDbm: -20 }]);
			expect(noiseShare(trace, 0, 1000)).toBeLessThan(0.001);
		}
	);
	it('is next to nothing on a line that falls on one point only', () => {
		const trace = buildLines({ rbwHz: 100 }, [{ frequencyHz: 100e6, levelDbm: -20 }]);
		expect(noiseShare(trace, 0, 1000)).toBeLessThan(0.001);
	});
	it('is small where a line stands in little noise', () => {
		const line = buildLines({ rbwHz: 10e3 }, [{ frequencyHz: 100e6, levelDbm: -60 }], -300);
		const noise = buildNoise('beside', { rbwHz: 10e3, rows: 10, scale: 'power' }, -140);
		const levelsDbm = Array.from(noise.levelsDbm, (level, i) => Math.max(level, line.levelsDbm[i]));
		expect(noiseShare({ ...noise, levelsDbm }, 0, 1000)).toBeLessThan(0.05);
	});
});

describe('the spread of a reading', () => {
	const ratioOf = (rows: number, setting: Partial<Trace>, request: Parameters<typeof readOff>[1]) => {
		const build = (seed: string) => buildNoise(seed, { rbwHz: 10e3, rows, ...setting }, -140);
		const { deviation } = overSeeds(60, (seed) => readOff(build(seed), request).value);
		return readOff(build('one more'), request).spread / deviation;
	};
	// 60 seeds know a deviation to 9 %: three of those.
	it.each<[number, Partial<Trace>, Parameters<typeof readOff>[1]]>([
		[1, { scale: 'power' }, { kind: 'channel-power', centreHz: 100e6, widthHz: 0.4e6 }],
		[10, { scale: 'power' }, { kind: 'channel-power', centreHz: 100e6, widthHz: 0.4e6 }],
		[10, { scale: 'log' }, { kind: 'channel-power', centreHz: 100e6, widthHz: 0.4e6 }],
		[5, { scale: 'power', detector: 'average' }, { kind: 'power-density', centreHz: 100e6, widthHz: 0.4e6 }],
		[1, { scale: 'log' }, { kind: 'noise-density', atHz: 100e6 }],
		[10, { scale: 'power' }, { kind: 'noise-density', atHz: 100e6 }],
		[10, { scale: 'voltage' }, { kind: 'noise-density', atHz: 100e6 }],
		[10, { scale: 'power' }, { kind: 'occupied-bandwidth', percent: 80 }]
	])('is the deviation over many seeds: %d rows, %j, %j', (rows, setting, request) => {
		const ratio = ratioOf(rows, setting, request);
		expect(ratio).toBeGreaterThan(0.73);
		expect(ratio).toBeLessThan(1.27);
	});
});
