import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { besselOrders } from '$lib/measure/bessel';
import { buildLines, buildNoise, buildTrace, overSeeds } from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

// Many seeds: seconds on a busy machine.
vi.setConfig({ testTimeout: 30_000 });

const carrierHz = 100e6;
const dbOf = (ratio: number) => 20 * Math.log10(Math.max(1e-12, Math.abs(ratio)));

/** Lines of FM with modulation index β, total −20 dBm. */
function fmLines(index: number, modulatingHz: number) {
	const order = Math.ceil(index + 6 + 2 * Math.sqrt(index));
	const levels = besselOrders(order, index);
	return Array.from({ length: 2 * order + 1 }, (_, i) => ({
		frequencyHz: carrierHz + (i - order) * modulatingHz,
		levelDbm: -20 + dbOf(levels[Math.abs(i - order)])
	}));
}
const amLines = (depth: number, modulatingHz: number) => [
	{ frequencyHz: carrierHz, levelDbm: -20 },
	{ frequencyHz: carrierHz - modulatingHz, levelDbm: -20 + dbOf(depth / 2) },
	{ frequencyHz: carrierHz + modulatingHz, levelDbm: -20 + dbOf(depth / 2) }
];

describe('fm-deviation {carrierHz}', () => {
	const request = { kind: 'fm-deviation', carrierHz } as const;
	it.each([0.2, 0.5, 1, 1.4347, 2, 2.4048256, 3.83, 5, 5.52, 8, 10, 14])(
		'finds index %d from its lines',
		(index) => {
			const { value, parts, unit } = readOff(
				buildLines({ rbwHz: 3e3, points: 2001 }, fmLines(index, 15_321)),
				request
			);
			expect(parts!.modulatingHz).toBeCloseTo(15_321, -0.5);
			expect(parts!.index / index).toBeCloseTo(1, 2);
			expect(value / (index * 15_321)).toBeCloseTo(1, 2);
			expect(unit).toBe('Hz');
		}
	);
	it('finds any index up to 20 within 1 % and 0.01', () =>
		fc.assert(
			fc.property(fc.double({ min: 0.05, max: 20, noNaN: true }), (index) => {
				const trace = buildLines({ rbwHz: 1e3, points: 4001 }, fmLines(index, 8e3));
				expect(Math.abs(readOff(trace, request).parts!.index - index)).toBeLessThan(0.01 + 0.01 * index);
			}),
			{ numRuns: 25 }
		));
	it('finds it from the lines that the span holds', () => {
		const setup = { startHz: 99.93e6, stopHz: 100.07e6, rbwHz: 1e3 };
		expect(readOff(buildLines(setup, fmLines(8, 10e3)), request).parts!.index).toBeCloseTo(8, 1);
	});
	it('warns that a small index could be amplitude modulation, and that amplitude modulation fits no index', () => {
		expect(codesOf(readOff(buildLines({ rbwHz: 3e3 }, fmLines(0.02, 20e3)), request))).toContain(
			'no-second-pair'
		);
		expect(codesOf(readOff(buildLines({ rbwHz: 3e3 }, fmLines(2, 20e3)), request))).toEqual([]);
		expect(codesOf(readOff(buildLines({ rbwHz: 3e3 }, amLines(1, 20e3)), request))).toContain('poor-fit');
	});
	it('says what it needs when the filter is wider than the modulating frequency', () =>
		expect(problemOf(buildLines({ rbwHz: 30e3 }, fmLines(2, 10e3)), request).needs).toContain(
			'resolution bandwidth'
		));
	it('strays in noise no more than three times what it says', () => {
		const lines = buildLines({ rbwHz: 3e3 }, fmLines(3, 20e3), -300);
		const build = (seed: string) => {
			const noise = buildNoise(seed, { rbwHz: 3e3, rows: 10, scale: 'power' }, -95);
			const levelsDbm = Array.from(
				noise.levelsDbm,
				(level, i) => 10 * Math.log10(10 ** (level / 10) + 10 ** (lines.levelsDbm[i] / 10))
			);
			return { ...noise, levelsDbm };
		};
		const { mean, deviation } = overSeeds(20, (seed) => readOff(build(seed), request).value);
		const { spread } = readOff(build('one more'), request);
		expect(Math.abs(mean - 60e3)).toBeLessThan(3 * spread);
		expect(deviation).toBeLessThan(3 * spread);
		expect(spread).toBeLessThan(600);
	});
});

describe('am-depth {carrierHz}', () => {
	const request = { kind: 'am-depth', carrierHz } as const;
	it.each([1, 0.8, 0.5, 0.3, 0.1, 0.02])('finds depth %d from its sidebands', (depth) => {
		const { value, unit, parts } = readOff(buildLines({ rbwHz: 3e3 }, amLines(depth, 20e3)), request);
		expect(value / (100 * depth)).toBeCloseTo(1, 3);
		expect(unit).toBe('%');
		expect(parts!.modulatingHz).toBeCloseTo(20e3, 0);
	});
	it('warns of a second pair, which frequency modulation would make', () =>
		expect(codesOf(readOff(buildLines({ rbwHz: 3e3 }, fmLines(1, 20e3)), request))).toContain('second-pair'));
	it('says what it needs when no sidebands stand apart', () =>
		expect(problemOf(buildLines({ rbwHz: 30e3 }, amLines(0.5, 10e3)), request).needs).toContain(
			'resolution bandwidth'
		));

	const overTime = (depth: number, modulatingHz: number, rbwHz = 100e3) =>
		buildTrace(
			{ startHz: carrierHz, stopHz: carrierHz, sweepTimeS: 5.3e-3, rbwHz },
			(timeS) => -20 + dbOf(1 + depth * Math.sin(2 * Math.PI * modulatingHz * timeS + 0.4))
		);
	it.each([0.9, 0.3, 0.05])('finds depth %d from the envelope in span 0', (depth) => {
		const { value, parts } = readOff(overTime(depth, 1234), request);
		expect(value).toBeCloseTo(100 * depth, 4);
		expect(parts!.modulatingHz).toBeCloseTo(1234, 1);
	});
	it('warns in span 0 when the filter takes something off the sidebands', () => {
		expect(codesOf(readOff(overTime(0.3, 1234, 10e3), request))).toContain('rbw-too-narrow');
		expect(codesOf(readOff(overTime(0.3, 1234), request))).toEqual([]);
	});
	it('has no number in span 0 without a whole period', () =>
		expect(problemOf(overTime(0.3, 100), request).problem).toContain('period'));
});
