/** Published and computed values of digital, pulsed and noisy spectra. */
import { describe, expect, it } from 'vitest';
import type { Emitter, EmitterOf } from '$lib/schemas/scene';
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { integratedPhaseNoise, phaseNoiseAt, phaseNoiseIntegral } from '$lib/server/bench/signal/phase-noise';
import { sincSquaredSum, sincSquaredSumBelow } from '$lib/server/bench/signal/sinc-squared';
import { waveformKurtosis } from '$lib/server/bench/signal/waveform-moments';
import { truth } from '$lib/server/bench/truth/truth';
import { powerRatioToDb } from '$lib/units/decibel';

const densityOf = <E extends Emitter>(emitter: E): Density => kindOf(emitter).density!(emitter);
const rrcOf = (rollOff: number): EmitterOf<'digital'> => ({
	kind: 'digital',
	frequencyHz: 1e9,
	levelDbm: 0,
	symbolRateHz: 1e6,
	rollOff,
	order: 4
});
const mskOf = (bt?: number): EmitterOf<'msk'> => ({
	kind: 'msk',
	frequencyHz: 1e9,
	levelDbm: 0,
	bitRateHz: 1e6,
	bt
});
const widthOf = (emitter: Emitter, percent: number): number =>
	truth({ emitters: [emitter] }, { kind: 'occupied-bandwidth', percent }).value;
const inside = (emitter: Emitter, widthHz: number): number =>
	10 ** (truth({ emitters: [emitter] }, { kind: 'channel-power', centreHz: 1e9, widthHz }).value / 10);

describe('a root-raised-cosine signal', () => {
	// Proakis, Digital Communications (from memory); closed-form primitive and root, computed.
	it.each([0.05, 0.22, 0.5, 1])(
		'of roll-off %f is 3.0103 dB down half a symbol rate away, for every roll-off',
		(rollOff) => {
			const density = densityOf(rrcOf(rollOff));
			const fall = density.densityMwPerHz(1e9) / density.densityMwPerHz(1e9 + 0.5e6);
			expect(powerRatioToDb(fall)).toBeCloseTo(3.0103, 4);
			expect(density.densityMwPerHz(1e9 + (1 + rollOff) * 0.5e6 + 1)).toBe(0);
		}
	);
	it.each([
		[0.2, 1.073079, 0.963662, 1.18723],
		[0.22, 1.084895, 0.960028, 1.20596],
		[0.25, 1.103068, 0.954577, 1.23404],
		[1, 1.632954, 0.81831, 1.93616]
	])(
		'of roll-off %f occupies %f Rs, holds %f inside Rs, is %f Rs wide at 26 dB',
		(rollOff, occupied, share, wide) => {
			expect(widthOf(rrcOf(rollOff), 99) / 1e6).toBeCloseTo(occupied, 6);
			expect(inside(rrcOf(rollOff), 1e6)).toBeCloseTo(share, 6);
			const { value } = truth({ emitters: [rrcOf(rollOff)] }, { kind: 'x-db-bandwidth', db: 26 });
			expect(value / 1e6).toBeCloseTo(wide, 5);
		}
	);
	it('at 3.84 Msymbol/s and 0.22 occupies 4.16600 MHz (computed), less than its 5 MHz raster', () =>
		expect(widthOf({ ...rrcOf(0.22), symbolRateHz: 3.84e6 }, 99) / 1e6).toBeCloseTo(4.166, 5));
	// bench.md §1: noise 2, 16QAM 1.487, QPSK 1.236 at roll-off 0.22.
	it.each([
		[4, 1.236],
		[16, 1.487]
	] as const)('of order %i has E|x|⁴/P² = %f', (order, kurtosis) =>
		expect(waveformKurtosis(order, 0.22)).toBeCloseTo(kurtosis, 3)
	);
});

describe('unfiltered rectangular symbols, sinc²', () => {
	// Computed; textbooks print 20.56 for the first.
	const widthAt = (share: number): number => {
		let [low, high] = [0, 1e4];
		for (let i = 0; i < 80; i++) {
			const middle = (low + high) / 2;
			if (2 * sincSquaredSumBelow(0, 0, middle) - 1 < share) low = middle;
			else high = middle;
		}
		return 2 * low;
	};
	it.each([
		[0.99, 20.5716],
		[0.9, 1.69706],
		[0.999, 202.817]
	])('hold %f of their power in %f Rs', (share, width) => expect(widthAt(share)).toBeCloseTo(width, 3));
	it('hold 0.902823 between the first nulls and 0.773695 inside Rs; half power at 0.885893 Rs', () => {
		expect(2 * sincSquaredSumBelow(0, 0, 1) - 1).toBeCloseTo(0.902823, 6);
		expect(2 * sincSquaredSumBelow(0, 0, 0.5) - 1).toBeCloseTo(0.773695, 6);
		expect(sincSquaredSum(0, 0, 0.885893 / 2)).toBeCloseTo(0.5, 6);
	});
	it.each([
		[1.4303, -13.2615],
		[2.459, -17.8304]
	])('have a sidelobe at %f of %f dB', (x, level) =>
		expect(powerRatioToDb(sincSquaredSum(0, 0, x))).toBeCloseTo(level, 3)
	);
});

describe('minimum-shift keying', () => {
	// S = (16/π²)[cos 2πf/(1 − 16f²)]²: Amoroso 1980 (from memory); widths computed. Printed: 1.18.
	it.each([
		[99, 1.181815],
		[90, 0.776718],
		[99.9, 2.73539]
	])('holds %f %% in %f bit rates', (percent, width) =>
		expect(widthOf(mskOf(), percent) / 1e6).toBeCloseTo(width, 5)
	);
	it('holds 0.994946 between its first nulls, 1.5 bit rates apart; half power at 0.594482', () => {
		expect(inside(mskOf(), 1.5e6)).toBeCloseTo(0.994946, 6);
		const { value } = truth({ emitters: [mskOf()] }, { kind: 'x-db-bandwidth', db: powerRatioToDb(2) });
		expect(value / 1e6).toBeCloseTo(0.594482, 5);
	});
	// Murota & Hirade 1981, table of occupied bandwidths (from memory, two digits; its last row, plain MSK, says 1.20 where
	// 1.1818 is exact, so that the wider rows are taken to be 1 % high).
	it.each([
		[0.2, 0.79, 0.005],
		[0.25, 0.86, 0.005],
		[0.5, 1.04, 0.011]
	])('behind a Gaussian filter of BT = %f occupies %f bit rates', (bt, width, tolerance) =>
		expect(Math.abs(widthOf(mskOf(bt), 99) / 1e6 - width)).toBeLessThan(tolerance)
	);
	// Periodograms of forty records of 32768 random bits, windowed; computed apart from this code.
	it.each([
		[0.2, 0.7864, 0.5139],
		[0.25, 0.8552, 0.5619],
		[0.3, 0.9091, 0.6]
	])(
		'simulated bit by bit behind BT = %f occupies %f bit rates for 99 in 100, %f for 90',
		(bt, wide, narrow) => {
			expect(Math.abs(widthOf(mskOf(bt), 99) / 1e6 - wide)).toBeLessThan(0.001);
			expect(Math.abs(widthOf(mskOf(bt), 90) / 1e6 - narrow)).toBeLessThan(0.001);
		}
	);
});

describe('phase noise', () => {
	// IEEE Std 1139-2008: L(f) = ½Sφ(f). Computed.
	it('flat at −100 dBc/Hz from 1 kHz to 1 MHz is 9.99e-5 on one side: 0.0141351 rad', () => {
		const side = phaseNoiseIntegral([
			{ offsetHz: 1e3, dbcPerHz: -100 },
			{ offsetHz: 1e6, dbcPerHz: -100 }
		]);
		const area = side(1e6) - side(1e3);
		expect(area).toBeCloseTo(9.99e-5, 10);
		expect(Math.sqrt(2 * area)).toBeCloseTo(0.0141351, 7);
	});
	it('from −80 dBc/Hz at 1 kHz, 20 dB a decade down to 1 MHz, is 9.99e-6: 4.46990 mrad', () => {
		const points = [
			{ offsetHz: 1e3, dbcPerHz: -80 },
			{ offsetHz: 1e6, dbcPerHz: -140 }
		];
		const side = phaseNoiseIntegral(points);
		expect(side(1e6) - side(1e3)).toBeCloseTo(9.99e-6, 11);
		expect(1e3 * Math.sqrt(2 * (side(1e6) - side(1e3)))).toBeCloseTo(4.4699, 4);
		expect(powerRatioToDb(phaseNoiseAt(points, 1e4))).toBeCloseTo(-100, 9);
	});
	it('flat at −120 dBc/Hz is −54.157 dBc over 3.84 MHz and −75.229 dBc over 30 kHz', () => {
		const side = phaseNoiseIntegral([{ offsetHz: 1e6, dbcPerHz: -120 }]);
		expect(powerRatioToDb(side(5e6) - side(5e6 - 3.84e6))).toBeCloseTo(-54.157, 3);
		expect(powerRatioToDb(side(5e6) - side(5e6 - 30e3))).toBeCloseTo(-75.229, 3);
	});
	it('multiplied by ten in frequency rises 20 dB: a hundred times the mean square', () => {
		const raised = (db: number) => [{ offsetHz: 1e3, dbcPerHz: -110 + db }];
		expect(integratedPhaseNoise(raised(20)) / integratedPhaseNoise(raised(0))).toBeCloseTo(100, 9);
	});
});

describe('a pulsed carrier', () => {
	const pulsedOf = (widthS: number, periodS: number): EmitterOf<'pulsed'> => ({
		kind: 'pulsed',
		frequencyHz: 1e9,
		levelDbm: 0,
		widthS,
		periodS
	});
	const levelAt = (emitter: EmitterOf<'pulsed'>, offsetHz: number): number =>
		truth({ emitters: [emitter] }, { kind: 'marker', atHz: 1e9 + offsetHz }).value;

	// Fourier series of a rectangle; computed.
	it.each([
		[1e-6, 1e-3, -60, -30],
		[10e-6, 1e-3, -40, -20]
	])(
		'of %f s every %f s has a centre line at %f dB and a mean power of %f dB',
		(widthS, periodS, line, mean) => {
			const emitter = pulsedOf(widthS, periodS);
			expect(levelAt(emitter, 0)).toBeCloseTo(line, 9);
			expect(powerRatioToDb(kindOf(emitter).meanPowerMw(emitter))).toBeCloseTo(mean, 9);
		}
	);
	it('has lines at its repetition rate under a sinc: −3.9224 dB at half the first null, −0.14335 dB at a tenth', () => {
		const emitter = pulsedOf(1e-6, 1e-4);
		expect(levelAt(emitter, 0.5e6) - levelAt(emitter, 0)).toBeCloseTo(-3.9224, 4);
		expect(levelAt(emitter, 0.1e6) - levelAt(emitter, 0)).toBeCloseTo(-0.14335, 5);
		expect(levelAt(emitter, 1e6) - levelAt(emitter, 0)).toBeLessThan(-200);
	});
	it('has sidelobes of −13.2615 and −17.8304 dB', () => {
		const emitter = pulsedOf(1e-6, 1e-2);
		expect(levelAt(emitter, 1.4303e6) - levelAt(emitter, 0)).toBeCloseTo(-13.2615, 3);
		expect(levelAt(emitter, 2.459e6) - levelAt(emitter, 0)).toBeCloseTo(-17.8304, 3);
	});
});
