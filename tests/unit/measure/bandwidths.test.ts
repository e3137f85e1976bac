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

const symbolRateHz = 400e3;
const occupied = { kind: 'occupied-bandwidth', percent: 99 } as const;
const shaped = (rbwHz: number, setup: Partial<Trace> = {}, floorDbm = -160) =>
	buildDensity({ rbwHz, ...setup }, -20, raisedCosineDensity(100e6, symbolRateHz, 0.22), floorDbm);

describe('occupied-bandwidth {percent, centreHz?, widthHz?}', () => {
	it('finds 99 % of a root-raised-cosine signal within 0.5 % at a resolution of 2 %', () => {
		const { value, parts, unit } = readOff(shaped(8.6e3), occupied);
		expect(Math.abs(value / (1.084895 * symbolRateHz) - 1)).toBeLessThan(0.005);
		expect((parts!.lowerHz + parts!.upperHz) / 2).toBeCloseTo(100e6, -1);
		expect(unit).toBe('Hz');
	});
	it('cuts half a percent off each side, not the smallest width that holds 99 %', () => {
		// A wide part with 98 % and a narrow one far off with 2 %: the smallest 99 % would cut the wide part only on the outside.
		const trace = buildTrace({ rbwHz: 10e3 }, (frequencyHz) => {
			if (frequencyHz >= 99.7e6 && frequencyHz < 99.9e6) return -40;
			return frequencyHz > 100.3e6 && frequencyHz < 100.31e6
				? -40 + 10 * Math.log10((0.02 / 0.98) * (200 / 9))
				: -200;
		});
		const { parts } = readOff(trace, occupied);
		expect(parts!.lowerHz).toBeCloseTo(99.6995e6 + (0.005 / 0.98) * 200e3, -2);
		expect(parts!.upperHz).toBeGreaterThan(100.306e6);
		expect(parts!.upperHz).toBeLessThan(100.309e6);
	});
	it('goes by the power inside the window it is given', () => {
		const trace = buildLines({ rbwHz: 1e3 }, [
			{ frequencyHz: 99.8e6, levelDbm: -20 },
			{ frequencyHz: 100.2e6, levelDbm: -20 }
		]);
		expect(readOff(trace, occupied).value).toBeGreaterThan(400e3);
		const inside = readOff(trace, { ...occupied, centreHz: 100.2e6, widthHz: 50e3 });
		expect(inside.value).toBeLessThan(3e3);
		expect(inside.parts!.lowerHz).toBeLessThan(100.2e6);
	});
	it('takes any percentage', () => {
		const flat = buildTrace({ rbwHz: 2e3 }, () => -80);
		for (const percent of [10, 50, 90, 99.9]) {
			expect(readOff(flat, { ...occupied, percent }).value).toBeCloseTo((percent / 100) * 1.001e6, 3);
		}
	});
	it('remarks on a filter too wide for the width, and on none at 2 %', () => {
		expect(codesOf(readOff(shaped(8.6e3), occupied))).toEqual([]);
		expect(codesOf(readOff(shaped(30e3), occupied))).toContain('rbw-too-wide');
	});
	it('remarks on noise in the window once it is less than 34 dB under the signal', () => {
		const withNoise = (snrDb: number) => {
			// −20 dBm over 1 MHz of noise in a filter of 8 kHz.
			const floorDbm = -20 - snrDb + 10 * Math.log10((1.064467 * 8e3) / 1e6);
			return codesOf(readOff(shaped(8e3, {}, floorDbm), occupied));
		};
		expect(withNoise(35)).toEqual([]);
		expect(withNoise(33)).toEqual(['window-too-wide-for-snr']);
	});
	it('remarks on a signal that goes on beyond the window', () =>
		expect(codesOf(readOff(shaped(8e3), { ...occupied, centreHz: 100e6, widthHz: 300e3 }))).toContain(
			'window-too-narrow'
		));
	it('has no number in span 0 or where the window misses the trace', () => {
		const zeroSpan = buildTrace({ startHz: 100e6, stopHz: 100e6, sweepTimeS: 1e-3 }, () => -50);
		expect(problemOf(zeroSpan, occupied).needs).toBe('a span above 0');
		expect(problemOf(shaped(8e3), { ...occupied, centreHz: 90e6, widthHz: 1e6 }).problem).toContain(
			'outside'
		);
	});
	it('strays over averages of 30 as it says, with a bias under 0.5 %', () => {
		const shape = raisedCosineDensity(100e6, symbolRateHz, 0.22);
		const build = (seed: string) =>
			buildNoise(seed, { rbwHz: 8e3, points: 501, rows: 30, scale: 'power' }, -130, (frequencyHz) => {
				const density = shape(frequencyHz);
				return density > 0 ? -20 + 10 * Math.log10(density * 1.064467 * 8e3) : -300;
			});
		const { mean, deviation } = overSeeds(25, (seed) => readOff(build(seed), occupied).value);
		const { spread } = readOff(build('one more'), occupied);
		expect(Math.abs(mean / (1.084895 * symbolRateHz) - 1)).toBeLessThan(0.005);
		expect(spread / deviation).toBeGreaterThan(0.6);
		expect(spread / deviation).toBeLessThan(1.6);
	});
});

describe('x-db-bandwidth {db}', () => {
	it('finds the filter’s own width on a line: B at 3.0103 dB, √2·B at 6.0206 dB', () => {
		const trace = buildLines({ rbwHz: 100e3 }, [{ frequencyHz: 100e6, levelDbm: -20 }], -150);
		expect(readOff(trace, { kind: 'x-db-bandwidth', db: 3.0103 }).value).toBeCloseTo(100e3, -1);
		const six = readOff(trace, { kind: 'x-db-bandwidth', db: 6.0206 });
		expect(six.value).toBeCloseTo(141.42e3, -1.5);
		expect(codesOf(six)).toEqual(['rbw-too-wide']);
	});
	it('goes by the outermost crossings', () => {
		const trace = buildLines({ rbwHz: 3e3 }, [
			{ frequencyHz: 99.9e6, levelDbm: -30 },
			{ frequencyHz: 100.1e6, levelDbm: -20 }
		]);
		const { value, parts } = readOff(trace, { kind: 'x-db-bandwidth', db: 26 });
		expect(value).toBeGreaterThan(200e3);
		expect(value).toBeLessThan(212e3);
		expect(parts!.lowerHz).toBeLessThan(99.9e6);
	});
	it('has no number when the trace does not fall so far', () => {
		const flat = buildTrace({}, (frequencyHz) => (frequencyHz < 100e6 ? -20 : -50));
		expect(problemOf(flat, { kind: 'x-db-bandwidth', db: 26 }).problem).toContain('26 dB');
	});
});
