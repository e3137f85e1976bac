import { describe, expect, it } from 'vitest';
import { buildLines, buildNoise, buildTrace } from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

const carrierHz = 100e6;
const dbOf = (ratio: number) => 20 * Math.log10(Math.max(1e-6, Math.abs(ratio)));

/** Trapezoids of width `onS` at half height, repeating, over a floor 60 dB down. */
function burst(timeS: number, onS: number, periodS: number, edgeS: number, startS = 0): number {
	const t = (((timeS - startS) % periodS) + periodS) % periodS;
	const fromMiddle = Math.abs(t - periodS / 2);
	return Math.max(1e-3, Math.min(1, Math.max(0, (onS / 2 + edgeS / 2 - fromMiddle) / edgeS)));
}
const overTime = (onS: number, periodS: number, edgeS: number, sweepTimeS: number) =>
	buildTrace({ startHz: carrierHz, stopHz: carrierHz, sweepTimeS, rbwHz: 1e6 }, (timeS) =>
		dbOf(burst(timeS, onS, periodS, edgeS))
	);

describe('time', () => {
	it('reads on time, rise, fall and period at half voltage', () => {
		const { value, unit, parts, spread } = readOff(overTime(2e-3, 5e-3, 0.5e-3, 20e-3), { kind: 'time' });
		expect(value).toBeCloseTo(2e-3, 5);
		expect(unit).toBe('s');
		expect(parts!.periodS).toBeCloseTo(5e-3, 5);
		// 10 to 90 % of a straight edge is 0.8 of it.
		expect(parts!.riseS).toBeCloseTo(0.4e-3, 5);
		expect(parts!.fallS).toBeCloseTo(0.4e-3, 5);
		expect(spread).toBeLessThan(20e-6);
	});
	it('says when there is one burst only, and when there is none', () => {
		const single = readOff(overTime(2e-3, 5e-3, 0.5e-3, 5e-3), { kind: 'time' });
		expect(codesOf(single)).toEqual(['no-repetition']);
		expect(single.parts!.periodS).toBeUndefined();
		expect(problemOf(overTime(4e-3, 5e-3, 0.1e-3, 2e-3), { kind: 'time' }).problem).toContain(
			'rise and fall'
		);
	});
	it('leaves out the rise when the trace begins within every one', () => {
		const trace = buildTrace(
			{ startHz: carrierHz, stopHz: carrierHz, sweepTimeS: 10e-3, rbwHz: 1e6 },
			(timeS) => (timeS < 1e-3 ? dbOf(0.3) : timeS < 6e-3 ? 0 : -60)
		);
		const { value, parts } = readOff(trace, { kind: 'time' });
		expect(value).toBeCloseTo(5e-3, 4);
		expect(parts!.riseS).toBeUndefined();
		expect(parts!.fallS).toBeLessThan(20e-6);
	});
	it('needs span 0', () =>
		expect(
			problemOf(
				buildTrace({}, () => -50),
				{ kind: 'time' }
			).needs
		).toContain('span 0'));
	it('is not led astray by noise on the levels', () => {
		const setup = { startHz: carrierHz, stopHz: carrierHz, sweepTimeS: 20e-3, rbwHz: 1e6, rows: 20 };
		const noise = buildNoise('bursts', setup, -80);
		const levelsDbm = Array.from(
			noise.levelsDbm,
			(level, i) => level + dbOf(burst((i / 1000) * 20e-3, 2e-3, 5e-3, 0.1e-3))
		);
		const { value, parts } = readOff({ ...noise, levelsDbm }, { kind: 'time' });
		expect(value / 2e-3).toBeCloseTo(1, 1);
		expect(parts!.periodS! / 5e-3).toBeCloseTo(1, 1);
	});
});

describe('pulse {carrierHz}', () => {
	const request = { kind: 'pulse', carrierHz } as const;
	it('reads width and repetition over time in span 0', () => {
		const { value, unit, parts } = readOff(overTime(10e-6, 100e-6, 1e-6, 500e-6), request);
		expect(value).toBeCloseTo(10e-6, 7);
		expect(unit).toBe('s');
		expect(parts!.repetitionHz! / 10e3).toBeCloseTo(1, 3);
	});

	const sinc = (x: number) => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
	it.each([
		[10e-6, 20e3],
		[3e-6, 30e3],
		[1.3e-6, 21e3]
	])('reads width %d s and repetition %d Hz from the lines of the spectrum', (widthS, repetitionHz) => {
		const count = Math.floor(1e6 / repetitionHz);
		const lines = Array.from({ length: 2 * count + 1 }, (_, i) => {
			const offsetHz = (i - count) * repetitionHz;
			return { frequencyHz: carrierHz + offsetHz, levelDbm: -30 + dbOf(sinc(offsetHz * widthS)) };
		});
		const setup = { startHz: 99e6, stopHz: 101e6, rbwHz: 3e3, points: 2001 };
		const { value, parts } = readOff(buildLines(setup, lines), request);
		expect(value / widthS).toBeCloseTo(1, 2);
		expect(parts!.repetitionHz! / repetitionHz).toBeCloseTo(1, 3);
	});
	it('reads repetition from the time between spikes when the filter is wider than it', () => {
		// 1 µs every 1 ms, 100 kHz filter, 5 MHz in 200 ms: a spike every 5 points, two points wide.
		const sweepTimeS = 200e-3;
		const setup = {
			startHz: 97.5e6,
			stopHz: 102.5e6,
			rbwHz: 100e3,
			sweepTimeS,
			detector: 'positive-peak'
		} as const;
		const trace = buildTrace(setup, (frequencyHz) => {
			const index = Math.round((frequencyHz - 97.5e6) / 5e3);
			const level = -40 + dbOf(sinc((frequencyHz - carrierHz) * 1e-6));
			return index % 5 === 2 ? Math.max(-100, level) : -100;
		});
		const { value, parts } = readOff(trace, request);
		expect(value / 1e-6).toBeCloseTo(1, 1);
		expect(parts!.repetitionHz! / 1e3).toBeCloseTo(1, 2);
	});
	it('reads the width, and no repetition, from an envelope without gaps', () => {
		const setup = {
			startHz: 97.5e6,
			stopHz: 102.5e6,
			rbwHz: 30e3,
			sweepTimeS: 5,
			detector: 'positive-peak'
		} as const;
		const trace = buildTrace(setup, (frequencyHz) =>
			Math.max(-100, -40 + dbOf(sinc((frequencyHz - carrierHz) * 1e-6)))
		);
		const reading = readOff(trace, request);
		expect(reading.value / 1e-6).toBeCloseTo(1, 2);
		expect(reading.parts!.repetitionHz).toBeUndefined();
		expect(codesOf(reading)).toContain('no-repetition');
	});
});
