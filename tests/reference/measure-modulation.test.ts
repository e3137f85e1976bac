/**
 * Published and computed values of readings. Sources stand beside each check: M = source from memory, not opened; C = computed
 * from the formula given. Traces are made from closed forms here, not by the bench.
 */
import { describe, expect, it } from 'vitest';
import { besselOrders } from '$lib/measure/bessel';
import { noiseBandwidthHz } from '$lib/measure/resolution-filter';
import { buildDensity, buildLines, buildTrace, raisedCosineDensity } from '../factories/trace';
import { readOff } from '../factories/reading';

const dbOf = (voltageRatio: number) => 20 * Math.log10(Math.max(1e-12, Math.abs(voltageRatio)));

describe('amplitude modulation (Fourier; C)', () => {
	const sidebands = (dbc: number) =>
		buildLines(
			{ rbwHz: 1e3, startHz: 99.97e6, stopHz: 100.03e6 },
			[-10e3, 0, 10e3].map((offset) => ({ frequencyHz: 100e6 + offset, levelDbm: -20 + (offset ? dbc : 0) })),
			-130
		);
	it.each([
		[-40, 2.0],
		[-26, 10.024],
		[-16.4782, 30],
		[-12.0412, 50],
		[-6.0206, 100]
	])('sidebands %d dB from the carrier are %d %% deep', (dbc, percent) =>
		expect(readOff(sidebands(dbc), { kind: 'am-depth', carrierHz: 100e6 }).value / percent).toBeCloseTo(1, 3)
	);
	it('30 %: channel power −19.809 dBm over a carrier of −20 dBm, 26 dB width 20 kHz; 5 % has no 26 dB crossing of its own', () => {
		const trace = sidebands(-16.4782);
		const power = readOff(trace, { kind: 'channel-power', centreHz: 100e6, widthHz: 40e3 });
		expect(power.value).toBeCloseTo(-19.809, 2);
		// The filter adds its own skirt: √(9.52/12.04)·B beyond each sideband's top; alone it is 2·√(26/12.04)·B wide.
		expect(readOff(trace, { kind: 'x-db-bandwidth', db: 26 }).value).toBeCloseTo(20e3 + 1778, -1);
		expect(readOff(sidebands(-32.04), { kind: 'x-db-bandwidth', db: 26 }).value).toBeCloseTo(2939, -1);
	});
});

describe('frequency modulation (Abramowitz and Stegun Tables 9.1–9.5; zeros as in the tables read; mpmath C)', () => {
	it.each([
		[0.2, [0.990025, 0.0995008, 0.0049834, 0.00016625, 4.158e-6]],
		[1, [0.765198, 0.440051, 0.114903, 0.0195634, 0.00247664]],
		[5, [-0.177597, -0.327579, 0.0465651, 0.364831, 0.391232]],
		[10, [-0.245936, 0.0434727, 0.25463, 0.0583794, -0.219603]]
	])('J₀ … J₄ at %d', (index, values) => {
		const found = besselOrders(4, index);
		values.forEach((value, n) => expect(Math.abs(found[n] - value)).toBeLessThan(6e-7));
	});
	it('carrier nulls at 2.4048256, 5.5200781, 8.6537279; first-sideband nulls at 3.8317060, 7.0155867', () => {
		for (const zero of [2.4048256, 5.5200781, 8.6537279])
			expect(Math.abs(besselOrders(0, zero)[0])).toBeLessThan(1e-7);
		for (const zero of [3.831706, 7.0155867]) expect(Math.abs(besselOrders(1, zero)[1])).toBeLessThan(1e-7);
	});

	const deviationFrom = (levels: number[], modulatingHz: number, rbwHz: number) => {
		const lines = levels.flatMap((levelDbm, n) =>
			(n === 0 ? [0] : [-n, n]).map((k) => ({ frequencyHz: 100e6 + k * modulatingHz, levelDbm }))
		);
		const half = modulatingHz * (levels.length + 1);
		const setup = { rbwHz, startHz: 100e6 - half, stopHz: 100e6 + half, points: 2001 };
		return readOff(buildLines(setup, lines, -120), { kind: 'fm-deviation', carrierHz: 100e6 });
	};
	it('20 kHz at 10 kHz: lines of −12.999, −4.781, −9.049, −17.792, −29.372 dBm at 0 dBm total', () => {
		const { value } = deviationFrom([-12.999, -4.781, -9.049, -17.792, -29.372], 10e3, 300);
		expect(value / 20e3).toBeCloseTo(1, 2.5);
	});
	it('carrier and first pair equal is index 1.434696; first and second pair equal is 2.629874', () => {
		const at = (index: number) => Array.from(besselOrders(8, index), (level) => -10 + dbOf(level));
		expect(at(1.434696)[0]).toBeCloseTo(at(1.434696)[1], 4);
		expect(deviationFrom(at(1.434696), 10e3, 300).parts!.index).toBeCloseTo(1.434696, 2);
		expect(deviationFrom(at(2.629874), 10e3, 300).parts!.index).toBeCloseTo(2.629874, 2);
	});
	it.each([
		[75e3, 31.1873e3, 2.4048256],
		[75e3, 13.5868e3, 5.5200781],
		[5e3, 2.07915e3, 2.4048256]
	])(
		'null method: %d Hz of deviation and %d Hz of modulation make the carrier vanish',
		(deviationHz, modulatingHz, index) => {
			const levels = Array.from(besselOrders(9, index), (level) => -10 + dbOf(level));
			expect(deviationFrom(levels, modulatingHz, modulatingHz / 30).value / deviationHz).toBeCloseTo(1, 2);
		}
	);
	it('0.1 rad of phase makes −26.0097 dBc, the second pair −58.047 dBc', () => {
		const [carrier, first, second] = besselOrders(2, 0.1);
		expect(dbOf(first / carrier)).toBeCloseTo(-26.0097, 4);
		expect(dbOf(second / carrier)).toBeCloseTo(-58.047, 3);
	});
});

describe('root-raised-cosine signals (Proakis, Digital Communications, M; closed forms C)', () => {
	const symbolRateHz = 400e3;
	const trace = (rollOff: number) =>
		buildDensity(
			{ rbwHz: 1e3, points: 2001, scale: 'power' },
			0,
			raisedCosineDensity(100e6, symbolRateHz, rollOff),
			-150
		);
	it.each([
		[0.2, 1.073079, 0.963662, 1.18723],
		[0.22, 1.084895, 0.960028, 1.20596],
		[0.25, 1.103068, 0.954577, 1.23404],
		[1, 1.632954, 0.81831, 1.93616]
	])(
		'roll-off %d: 99 %% in %d, %d inside, 26 dB width %d symbol rates',
		(rollOff, occupied, inside, width26) => {
			const seen = trace(rollOff);
			const { value } = readOff(seen, { kind: 'occupied-bandwidth', percent: 99 });
			expect(value / symbolRateHz / occupied).toBeCloseTo(1, 2.3);
			const channel = readOff(seen, { kind: 'channel-power', centreHz: 100e6, widthHz: symbolRateHz });
			expect(10 ** (channel.value / 10)).toBeCloseTo(inside, 3);
			const { value: width } = readOff(seen, { kind: 'x-db-bandwidth', db: 26 });
			expect(width / symbolRateHz / width26).toBeCloseTo(1, 2.3);
		}
	);
	it('falls 3.0103 dB at half the symbol rate for every roll-off', () => {
		for (const rollOff of [0.22, 0.5, 1]) {
			const drop = readOff(trace(rollOff), { kind: 'delta', fromHz: 100e6, toHz: 100e6 + symbolRateHz / 2 });
			expect(drop.value).toBeCloseTo(-3.0103, 1);
		}
	});
	it.each([
		[0.22, -0.2457],
		[0.35, -0.3977],
		[1, -1.2494]
	])(
		'weighted by its own filter, roll-off %d, reads 10·log10(1 − α/4) = %d dB (UTRA own channel: TS 25.104 §6.6.2.2, R2; C)',
		(rollOff, db) => {
			const offsets = [{ offsetHz: 50e3, widthHz: 1e3 }];
			const base = { kind: 'adjacent-channel', centreHz: 100e6, offsets } as const;
			// The neighbour is the same in both, so the difference of the ratios is that of one's own channel.
			const weighted = readOff(trace(rollOff), { ...base, widthHz: symbolRateHz, rrcRollOff: rollOff });
			const own = weighted.parts![0].levelDbm - weighted.parts![0].dbc;
			expect(own).toBeCloseTo(db, 2);
		}
	);
	it('white noise through the weighting of 3.84 MHz has that bandwidth: 65.843 dB·Hz', () => {
		const flat = buildTrace({ startHz: 90e6, stopHz: 110e6, rbwHz: 30e3, scale: 'power' }, () => -80);
		const request = { kind: 'adjacent-channel', centreHz: 100e6, widthHz: 3.84e6, rrcRollOff: 0.22 } as const;
		const [part] = readOff(flat, { ...request, offsets: [{ offsetHz: 5e6, widthHz: 3.84e6 }] }).parts!;
		const densityDbm = -80 - 10 * Math.log10(noiseBandwidthHz(30e3));
		expect(part.levelDbm - densityDbm).toBeCloseTo(65.843, 3);
	});
	it('UTRA: 3.84 Mcps of roll-off 0.22 occupies 4.16600 MHz (C), under the 5 MHz of its channel (M)', () => {
		const seen = buildDensity(
			{ startHz: 97e6, stopHz: 103e6, rbwHz: 10e3, points: 2001 },
			0,
			raisedCosineDensity(100e6, 3.84e6, 0.22),
			-150
		);
		const { value } = readOff(seen, { kind: 'occupied-bandwidth', percent: 99 });
		expect(value / 4.166e6).toBeCloseTo(1, 2.3);
	});
});

describe('phase noise (L(f) = ½·Sφ(f): IEEE Std 1139, front matter read; C)', () => {
	it.each([
		['power', -95.271],
		['log', -92.765]
	] as const)('−75 dBm in 1 kHz beside −10 dBm, %s-averaged, is %d dBc/Hz', (scale, dbcPerHz) => {
		const trace = buildTrace(
			{ rbwHz: 1e3, startHz: 99.9e6, stopHz: 100.1e6, scale, mode: 'average', count: 100 },
			(f) => Math.max(-75, -10 - 12.0412 * ((f - 100e6) / 1e3) ** 2)
		);
		const reading = readOff(trace, { kind: 'phase-noise', carrierHz: 100e6, offsetHz: 50e3 });
		expect(reading.value).toBeCloseTo(dbcPerHz, 3);
	});
});

describe('pulsed carriers (Fourier series; C)', () => {
	const sinc = (x: number) => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
	it.each([
		[1e-6, 1e3, -60],
		[10e-6, 1e3, -40]
	])(
		'%d s at %d Hz: lines %d dB under the peak at the centre, nulls at 1/τ',
		(widthS, repetitionHz, centreDb) => {
			// 20·log10(τ·PRF), read with a filter a tenth of the repetition, over ±5 repetitions.
			const lines = Array.from({ length: 11 }, (_, i) => ({
				frequencyHz: 100e6 + (i - 5) * repetitionHz,
				levelDbm: dbOf(widthS * repetitionHz * sinc((i - 5) * repetitionHz * widthS))
			}));
			const setup = { startHz: 100e6 - 5.5e3, stopHz: 100e6 + 5.5e3, rbwHz: 100 };
			const { value } = readOff(buildLines(setup, lines, -150), { kind: 'marker', atHz: 100e6 });
			expect(value).toBeCloseTo(centreDb, 2);
		}
	);
	it('width and repetition come back from the lines', () => {
		const lines = Array.from({ length: 121 }, (_, i) => ({
			frequencyHz: 100e6 + (i - 60) * 10e3,
			levelDbm: dbOf(0.1 * sinc((i - 60) * 0.1))
		}));
		const trace = buildLines({ startHz: 99.4e6, stopHz: 100.6e6, rbwHz: 1e3, points: 5001 }, lines, -100);
		const { value, parts } = readOff(trace, { kind: 'pulse', carrierHz: 100e6 });
		expect(value / 10e-6).toBeCloseTo(1, 2.3);
		expect(parts!.repetitionHz! / 10e3).toBeCloseTo(1, 4);
	});
	it('in span 0 the width at half voltage is the pulse’s own (±0.5 %), repetition 1/PRF', () => {
		// Edges of a Gaussian filter, 0.67925/B from 10 to 90 %, of B = 1 MHz on pulses of 20 µs every 100 µs.
		const rbwHz = 1e6;
		const sigmaS = 0.67925 / rbwHz / 2.5631;
		const step = (t: number) => 1 / (1 + Math.exp((-1.702 * t) / sigmaS));
		const trace = buildTrace({ startHz: 100e6, stopHz: 100e6, rbwHz, sweepTimeS: 500e-6 }, (timeS) => {
			const t = ((timeS + 50e-6) % 100e-6) - 50e-6;
			return -20 + dbOf(Math.max(1e-4, step(t + 10e-6) - step(t - 10e-6)));
		});
		const { value, parts } = readOff(trace, { kind: 'pulse', carrierHz: 100e6 });
		expect(value / 20e-6).toBeCloseTo(1, 2.3);
		expect(parts!.repetitionHz! / 10e3).toBeCloseTo(1, 3);
	});
});
