import { describe, expect, it } from 'vitest';
import { lineSpacing } from '$lib/measure/line-spacing';
import { linesOf } from '$lib/measure/line-spectrum';
import { buildLines, buildNoise, buildTrace } from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

const wide = { startHz: 10e6, stopHz: 210e6, rbwHz: 1e6, points: 2001 };
const harmonicSeries = buildLines(
	wide,
	[
		{ frequencyHz: 50e6, levelDbm: -10 },
		{ frequencyHz: 100e6, levelDbm: -50 },
		{ frequencyHz: 150e6, levelDbm: -60 }
	],
	-110
);

describe('linesOf(trace)', () => {
	it('finds lines and their exact places between the points, and no noise', () => {
		const placed = [99.83217e6, 100.0004e6, 100.31111e6].map((frequencyHz) => ({
			frequencyHz,
			levelDbm: -40
		}));
		const found = linesOf(buildLines({ rbwHz: 10e3 }, placed));
		expect(found).toHaveLength(3);
		found.forEach(({ frequencyHz, levelDbm }, i) => {
			expect(Math.abs(frequencyHz - placed[i].frequencyHz)).toBeLessThan(1);
			expect(levelDbm).toBeCloseTo(-40, 4);
		});
		for (const rows of [1, 30])
			for (const detector of ['sample', 'rise-fall'] as const)
				expect(linesOf(buildNoise('no lines', { rbwHz: 10e3, rows, detector }, -140))).toEqual([]);
	});
});

describe('lineSpacing(lines, nearHz, toleranceHz)', () => {
	const at = (...numbers: number[]) =>
		numbers.map((n) => ({ index: n, frequencyHz: 100e6 + n * 12_345, levelDbm: -50 - Math.abs(n) }));
	it('finds the spacing though lines are missing, the carrier among them', () => {
		const found = lineSpacing(at(-4, -3, -1, 1, 3, 4), 100.001e6, 100)!;
		expect(found.spacingHz).toBeCloseTo(12_345, 3);
		expect(found.carrierHz).toBeCloseTo(100e6, 3);
	});
	it('finds none where lines keep to none', () => {
		const odd = [0, 1, 2.4].map((n) => ({ index: 0, frequencyHz: 100e6 + n * 10e3, levelDbm: -50 }));
		expect(lineSpacing(odd, 100e6, 100)).toBeNull();
	});
});

describe('harmonics {fundamentalHz, count}', () => {
	it('lists count harmonics from the second, against the fundamental; the value is the strongest', () => {
		const { value, unit, parts } = readOff(harmonicSeries, {
			kind: 'harmonics',
			fundamentalHz: 50e6,
			count: 2
		});
		expect(value).toBeCloseTo(-40, 4);
		expect(unit).toBe('dBc');
		expect(parts).toHaveLength(2);
		expect(parts![1]).toMatchObject({ n: 3 });
		expect(parts![1].frequencyHz).toBeCloseTo(150e6, -1);
		expect(parts![1].levelDbm).toBeCloseTo(-60, 3);
	});
	it('leaves out what lies beyond the trace, and warns of what is only noise', () => {
		const reading = readOff(harmonicSeries, { kind: 'harmonics', fundamentalHz: 50e6, count: 5 });
		expect(reading.parts!.map(({ n }) => n)).toEqual([2, 3, 4]);
		expect(codesOf(reading)).toEqual(['near-noise', 'window-outside-span']);
		expect(
			problemOf(harmonicSeries, { kind: 'harmonics', fundamentalHz: 200e6, count: 2 }).problem
		).toContain('No harmonic');
	});
});

describe('intercept {lowerHz, upperHz}', () => {
	const request = { kind: 'intercept', lowerHz: 100e6, upperHz: 101e6 } as const;
	const twoTones = (lowerProductDbm: number, upperProductDbm: number, rbwHz = 30e3) =>
		buildLines(
			{ startHz: 98e6, stopHz: 103e6, rbwHz },
			[
				{ frequencyHz: 100e6, levelDbm: -20 },
				{ frequencyHz: 101e6, levelDbm: -23 },
				{ frequencyHz: 99e6, levelDbm: lowerProductDbm },
				{ frequencyHz: 102e6, levelDbm: upperProductDbm }
			],
			-150
		);
	it('takes unequal tones into account, and gives the lower of the two sides', () => {
		// TOI +15: 2·(−20) + (−23) − 30 = −93, and −20 + 2·(−23) − 30 = −96.
		const same = readOff(twoTones(-93, -96), request);
		expect(same.value).toBeCloseTo(15, 2);
		expect(same.parts!.upperDbm).toBeCloseTo(15, 2);
		const worseAbove = readOff(twoTones(-93, -86), request);
		expect(worseAbove.value).toBeCloseTo(10, 2);
		expect(worseAbove.parts!.lowerDbm).toBeCloseTo(15, 2);
	});
	it('reads one side when the other lies outside', () => {
		const half = buildLines({ startHz: 98.9e6, stopHz: 101.5e6, rbwHz: 30e3 }, [
			{ frequencyHz: 100e6, levelDbm: -20 },
			{ frequencyHz: 101e6, levelDbm: -20 },
			{ frequencyHz: 99e6, levelDbm: -90 }
		]);
		const reading = readOff(half, request);
		expect(reading.value).toBeCloseTo(15, 2);
		expect(reading.parts!.upperDbm).toBeUndefined();
		expect(codesOf(reading)).toEqual(['window-outside-span']);
	});
	it('warns of products in the noise and of a filter too wide to part them', () => {
		expect(codesOf(readOff(twoTones(-200, -200), request))).toContain('near-noise');
		expect(codesOf(readOff(twoTones(-93, -96, 500e3), request))).toContain('rbw-too-wide');
	});
});

describe('phase-noise {carrierHz, offsetHz}', () => {
	const skirt = (dbcPerHz: number, rbwHz: number) =>
		buildTrace({ rbwHz, scale: 'power' }, (frequencyHz) => {
			const line = 10 ** (-1 - (12.0412 * ((frequencyHz - 100e6) / rbwHz) ** 2) / 10);
			return 10 * Math.log10(line + 10 ** ((-10 + dbcPerHz) / 10) * 1.064467 * rbwHz);
		});
	it('reads density over carrier on either side', () => {
		for (const offsetHz of [-100e3, 100e3]) {
			const { value, unit } = readOff(skirt(-100, 3e3), { kind: 'phase-noise', carrierHz: 100e6, offsetHz });
			expect(value).toBeCloseTo(-100, 3);
			expect(unit).toBe('dBc/Hz');
		}
	});
	it('warns when the filter still shows the carrier there', () => {
		expect(
			codesOf(readOff(skirt(-100, 3e3), { kind: 'phase-noise', carrierHz: 100e6, offsetHz: 5e3 }))
		).toContain('rbw-too-wide');
		expect(
			codesOf(readOff(skirt(-100, 3e3), { kind: 'phase-noise', carrierHz: 100e6, offsetHz: 50e3 }))
		).toEqual([]);
	});
});

describe('mask {limits}', () => {
	const limits = [
		{ startHz: 99.5e6, stopHz: 99.9e6, levelDbm: -60 },
		{ startHz: 100.1e6, stopHz: 100.5e6, levelDbm: -50 }
	];
	const trace = buildLines({ rbwHz: 10e3 }, [
		{ frequencyHz: 100e6, levelDbm: -10 },
		{ frequencyHz: 100.3e6, levelDbm: -47 },
		{ frequencyHz: 99.7e6, levelDbm: -61 }
	]);
	it('gives the worst margin, where it is and in which segment; positive passes', () => {
		const { value, parts, unit } = readOff(trace, { kind: 'mask', limits });
		expect(value).toBeCloseTo(-3, 4);
		expect(unit).toBe('dB');
		expect(parts).toMatchObject({ segment: 1, frequencyHz: 100.3e6 });
		expect(readOff(trace, { kind: 'mask', limits: [limits[0]] }).value).toBeCloseTo(1, 4);
	});
	it('judges what lies on the trace, and says that the rest was not', () => {
		const beyond = [...limits, { startHz: 101e6, stopHz: 102e6, levelDbm: -90 }];
		expect(codesOf(readOff(trace, { kind: 'mask', limits: beyond }))).toEqual(['window-outside-span']);
		expect(problemOf(trace, { kind: 'mask', limits: [beyond[2]] }).problem).toContain('Every segment');
	});
	it('judges a segment that falls between two points by the nearest', () => {
		const narrow = [{ startHz: 100.3002e6, stopHz: 100.3004e6, levelDbm: -50 }];
		expect(readOff(trace, { kind: 'mask', limits: narrow }).value).toBeCloseTo(-3, 4);
	});
});
