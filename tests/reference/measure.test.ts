/**
 * Published and computed values of readings. Sources stand beside each check: M = source from memory, not opened; C = computed
 * from the formula given. Traces are made from closed forms here, not by the bench.
 */
import { describe, expect, it } from 'vitest';
import { averageSpreadDb, independentValues } from '$lib/measure/noise-statistics';
import { filterWidthHz, noiseBandwidthHz, sweepLossDb } from '$lib/measure/resolution-filter';
import { noiseBiasDb } from '$lib/measure/scale';
import { buildLines, buildNoise, buildTrace } from '../factories/trace';
import { problemOf, readOff } from '../factories/reading';

describe('log-average bias and filter bandwidths (exponential law: Rice, BSTJ 23/24, M; digamma DLMF §5.4, M; C)', () => {
	it('noise averaged in dB lies 2.506816 dB under its power, averaged in volts 1.049 dB', () => {
		expect(noiseBiasDb.log).toBeCloseTo(2.506816, 6);
		expect(noiseBiasDb.voltage).toBeCloseTo(1.0491, 4);
	});
	it('seeded noise does so, and strays by 5.570043 dB (four standard errors)', () => {
		const trace = buildNoise('B1', { rbwHz: 10e3, points: 10001 }, -140);
		const levels = Array.from(trace.levelsDbm);
		const mean = levels.reduce((a, b) => a + b, 0) / levels.length;
		const powerDbm = -140 + 10 * Math.log10(1.064467e4);
		expect(Math.abs(mean - powerDbm + 2.506816)).toBeLessThan((4 * 5.57) / 100);
		const deviation = Math.sqrt(levels.reduce((sum, level) => sum + (level - mean) ** 2, 0) / levels.length);
		expect(Math.abs(deviation - 5.570043)).toBeLessThan(0.3);
	});
	it('a Gaussian filter has noise bandwidth 1.0644670 B, B60/B3 4.46448, B60/B6 3.15686, B6/B3 √2', () => {
		expect(noiseBandwidthHz(1)).toBeCloseTo(1.064467, 7);
		const half = 10 * Math.log10(2);
		expect(filterWidthHz(60, 1) / filterWidthHz(half, 1)).toBeCloseTo(4.46448, 4);
		expect(filterWidthHz(60, 1) / filterWidthHz(2 * half, 1)).toBeCloseTo(3.15686, 4);
		expect(filterWidthHz(2 * half, 1) / filterWidthHz(half, 1)).toBeCloseTo(Math.SQRT2, 9);
	});
	it.each([
		['log', 1e3, -27.7645],
		['log', 10e3, -37.7645],
		['power', 1e3, -30.2713],
		['power', 10e3, -40.2713]
	] as const)(
		'a noise marker on a %s-averaged trace adds, at B = %d Hz, %d dB',
		(scale, rbwHz, correction) => {
			const trace = buildTrace({ rbwHz, scale, mode: 'average', count: 100 }, () => -100);
			expect(readOff(trace, { kind: 'noise-density', atHz: 100e6 }).value).toBeCloseTo(-100 + correction, 4);
		}
	);
});

describe('averages of noise (Rényi 1953, M; Rice level crossings, M; zeta DLMF §25.12, M; C)', () => {
	it.each([
		[1, 5.57],
		[10, 1.4084],
		[100, 0.43538]
	])('a power average of %d values strays by %d dB', (values, deviation) =>
		expect(averageSpreadDb('power', values) / deviation).toBeCloseTo(1, 1.9)
	);
	it('T seconds of noise in B hold 1.5054·B·T values of power, 1.8459·B·T of dB', () => {
		const trace = (scale: 'log' | 'power') =>
			buildTrace({ scale, sweepTimeS: 1, detector: 'average' }, () => -100);
		expect(independentValues(trace('power'), 1000) / (1.5054 * 1e4)).toBeCloseTo(1, 3);
		expect(independentValues(trace('log'), 1000) / (1.8459 * 1e4)).toBeCloseTo(1, 3);
	});
	it('a point behind VBW = B/100 strays by 0.722 dB (C7 of the same derivation)', () => {
		const trace = buildTrace({ rbwHz: 10e3, vbwHz: 100, sweepTimeS: 1000 }, () => -100);
		expect(averageSpreadDb('log', independentValues(trace, 1))).toBeCloseTo(0.722, 1.9);
	});
});

describe('sweep loss (W. W. Peterson, Tech. Rep. 38, Univ. of Michigan 1955: abstract read; C)', () => {
	it.each([
		[0.1, 0.0042],
		[0.4, 0.0666],
		[1, 0.3863],
		[2.26618, 1.5051],
		[10, 6.5558]
	])('at r = S/B² of %d a line loses %d dB', (r, lossDb) =>
		expect(sweepLossDb(r * 1e8, 1e4)).toBeCloseTo(lossDb, 4)
	);
});

describe('the sum over points (Poisson; C)', () => {
	/** The highest that a line of 0 dBm reads, wherever it stands among the points; 1 ± 2·exp(−3.5597·(B/Δ)²) as a power. */
	const highestReading = (stepPerRbw: number): number => {
		const rbwHz = 10e3;
		const stepHz = stepPerRbw * rbwHz;
		const setup = { rbwHz, points: 201, startHz: 100e6 - 100 * stepHz, stopHz: 100e6 + 100 * stepHz };
		const offsets = Array.from({ length: 41 }, (_, i) => (i / 40 - 0.5) * stepHz);
		const errors = offsets.map((offset) => {
			const trace = buildLines(setup, [{ frequencyHz: 100e6 + offset, levelDbm: 0 }], -200);
			return readOff(trace, { kind: 'channel-power', centreHz: 100e6, widthHz: 0.5e6 }).value;
		});
		return Math.max(...errors);
	};
	it.each([
		[1, 0.24, 0.0005],
		[0.75, 0.0155, 0.00005],
		[0.5, 6e-6, 0.5e-6]
	])('at a spacing of %d B a line reads up to %d dB high', (stepPerRbw, rippleDb, toleranceDb) =>
		expect(Math.abs(highestReading(stepPerRbw) - rippleDb)).toBeLessThan(toleranceDb)
	);
	it('power density is power − 10·log10 of the width: −20 dBm in 3.84 MHz is −85.843 dBm/Hz', () => {
		const trace = buildLines(
			{ startHz: 95e6, stopHz: 105e6, rbwHz: 30e3 },
			[{ frequencyHz: 100e6, levelDbm: -20 }],
			-200
		);
		expect(readOff(trace, { kind: 'power-density', centreHz: 100e6, widthHz: 3.84e6 }).value).toBeCloseTo(
			-85.843,
			3
		);
	});
});

describe('intermodulation and harmonics (Pozar, Microwave Engineering 4th ed. §10.3, contents read; cubic algebra C)', () => {
	it.each([
		[-20, -90],
		[-30, -120],
		[-40, -150]
	])('tones of %d dBm with products of %d dBm have their intercept at +15 dBm', (toneDbm, productDbm) => {
		const lines = [99, 100, 101, 102].map((mhz) => ({
			frequencyHz: mhz * 1e6,
			levelDbm: mhz === 100 || mhz === 101 ? toneDbm : productDbm
		}));
		const trace = buildLines({ startHz: 98e6, stopHz: 103e6, rbwHz: 30e3 }, lines, -190);
		const { value } = readOff(trace, { kind: 'intercept', lowerHz: 100e6, upperHz: 101e6 });
		expect(value).toBeCloseTo(15, 2);
	});
	it('harmonics of −40 and −50 dBc are 1.04881 % of distortion', () => {
		const trace = buildLines(
			{ startHz: 10e6, stopHz: 210e6, rbwHz: 1e6, points: 2001 },
			[
				{ frequencyHz: 50e6, levelDbm: -10 },
				{ frequencyHz: 100e6, levelDbm: -50 },
				{ frequencyHz: 150e6, levelDbm: -60 }
			],
			-160
		);
		const { value, unit } = readOff(trace, { kind: 'thd', fundamentalHz: 50e6, count: 2 });
		expect(value).toBeCloseTo(1.04881, 4);
		expect(unit).toBe('%');
	});
	it('−65 dBm beside −10 dBm is a second harmonic of −55 dBc', () => {
		const trace = buildLines(
			{ startHz: 10e6, stopHz: 110e6, rbwHz: 300e3 },
			[
				{ frequencyHz: 50e6, levelDbm: -10 },
				{ frequencyHz: 100e6, levelDbm: -65 }
			],
			-160
		);
		expect(readOff(trace, { kind: 'harmonics', fundamentalHz: 50e6, count: 1 }).value).toBeCloseTo(-55, 3);
	});
});

describe('occupied bandwidth (RR 1.153 and ITU-R SM.328: half a percent on each side; definition R2)', () => {
	it('is not the smallest width that holds 99 %: an asymmetric spectrum tells them apart', () => {
		// Density falling straight from 2 to 0 over 1 MHz: edges at 1 − √0.995 and 1 − √0.005 of it (C).
		const trace = buildTrace(
			{ rbwHz: 2e3, points: 5001, scale: 'power' },
			(frequencyHz) => 10 * Math.log10(Math.max(1e-9, 100.5e6 - frequencyHz))
		);
		const { parts } = readOff(trace, { kind: 'occupied-bandwidth', percent: 99 });
		expect((parts!.lowerHz - 99.5e6) / 1e6).toBeCloseTo(1 - Math.sqrt(0.995), 3);
		expect((parts!.upperHz - 99.5e6) / 1e6).toBeCloseTo(1 - Math.sqrt(0.005), 3);
	});
	it('a span that holds no crossing has no x dB width', () => {
		const trace = buildTrace({}, () => -50);
		expect(problemOf(trace, { kind: 'x-db-bandwidth', db: 26 }).needs).toContain('wider span');
	});
});
