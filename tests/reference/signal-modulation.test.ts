/** Published and computed values of amplitude, frequency and phase modulation. */
import { besselj } from 'bessel';
import { describe, expect, it } from 'vitest';
import type { EmitterOf } from '$lib/schemas/scene';
import { besselJ } from '$lib/server/bench/signal/bessel';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { powerRatioToDb } from '$lib/units/decibel';

const phases = { carrierRad: 0.4, modulationRad: 1.1 };
const powersOf = (emitter: EmitterOf<'am'> | EmitterOf<'fm'> | EmitterOf<'pm'>) =>
	new Map(
		kindOf(emitter).lines!(emitter, phases).map((line) => [
			Math.round(line.frequencyHz - emitter.frequencyHz),
			line.re ** 2 + line.im ** 2
		])
	);
const amOf = (depth: number): EmitterOf<'am'> => ({
	kind: 'am',
	frequencyHz: 100e6,
	levelDbm: 0,
	modulatingHz: 10e3,
	depth
});
const fmOf = (deviationHz: number, modulatingHz = 10e3): EmitterOf<'fm'> => ({
	kind: 'fm',
	frequencyHz: 100e6,
	levelDbm: 0,
	modulatingHz,
	deviationHz
});

describe('amplitude modulation', () => {
	// Computed: 20 log10(m/2), 10 log10(1 + m²/2), 20 log10(1 + m).
	it.each([
		[1, -6.0206, 1.7609],
		[0.8, -7.9588, 1.2057],
		[0.5, -12.0412, 0.5115],
		[0.3, -16.4782, 0.1912],
		[0.1, -26.0206, 0.0217],
		[0.01, -46.0206, 0.0002]
	])('of depth %f has sidebands at %f dBc and raises the power by %f dB', (depth, sidebandDbc, riseDb) => {
		const powers = powersOf(amOf(depth));
		expect(powerRatioToDb(powers.get(-10e3)!)).toBeCloseTo(sidebandDbc, 4);
		expect(powerRatioToDb(powers.get(10e3)!)).toBeCloseTo(sidebandDbc, 4);
		expect(powerRatioToDb(kindOf(amOf(depth)).meanPowerMw(amOf(depth)))).toBeCloseTo(riseDb, 4);
	});
	it.each([
		[1, 6.0206],
		[0.5, 3.5218]
	])('of depth %f has a crest of %f dB', (depth, crestDb) =>
		expect(powerRatioToDb(kindOf(amOf(depth)).peakPowerMw(amOf(depth)))).toBeCloseTo(crestDb, 4)
	);
	it('of 2.000 % has sidebands at −40 dBc, of 10.024 % at −26 dBc (computed)', () => {
		expect(powerRatioToDb(powersOf(amOf(0.02)).get(10e3)!)).toBeCloseTo(-40, 4);
		expect(powerRatioToDb(powersOf(amOf(0.10024)).get(10e3)!)).toBeCloseTo(-26, 3);
	});
});

describe('besselJ(highestOrder, x)', () => {
	// Abramowitz & Stegun (1964), tables 9.1 to 9.4; the digits here from mpmath.
	const table: [number, number[]][] = [
		[0.2, [0.990025, 0.0995008, 0.0049834, 0.00016625, 4.158e-6, 8.319e-8, 1.387e-9]],
		[0.5, [0.93847, 0.242268, 0.030604, 0.00256373, 1.607e-4, 8.054e-6, 3.361e-7]],
		[1, [0.765198, 0.440051, 0.114903, 0.0195634, 0.00247664, 2.498e-4, 2.094e-5]],
		[2, [0.223891, 0.576725, 0.352834, 0.128943, 0.0339957, 0.00703963, 0.00120243]],
		[
			5,
			[
				-0.177597, -0.327579, 0.0465651, 0.364831, 0.391232, 0.261141, 0.131049, 0.0533764, 0.0184052,
				0.00552028, 0.0014678
			]
		],
		[
			10,
			[
				-0.245936, 0.0434727, 0.25463, 0.0583794, -0.219603, -0.234062, -0.0144588, 0.216711, 0.317854,
				0.291856, 0.207486
			]
		]
	];
	it.each(table)('at β = %f has the tabulated orders', (x, orders) => {
		const values = besselJ(orders.length - 1, x);
		// Half a unit of the last printed digit: four digits in the smallest, six in the others.
		orders.forEach((value, n) =>
			expect(Math.abs(values[n] - value)).toBeLessThanOrEqual(
				Math.abs(value) < 1e-3 && x < 5 ? 5e-4 * Math.abs(value) : 5.1e-6 * Math.max(0.1, Math.abs(value))
			)
		);
	});
	it('agrees with an independent library to its 2e-7', () => {
		for (let x = 0.1; x < 30; x += 0.37) {
			const values = besselJ(12, x);
			for (let n = 0; n <= 12; n++) expect(Math.abs(values[n] - besselj(x, n))).toBeLessThan(2e-7);
		}
	});
	// Abramowitz & Stegun table 9.5, as read in two secondary sources; mpmath.
	it.each([2.4048256, 5.5200781, 8.6537279, 11.7915344, 14.9309177])('has J0 = 0 at %f', (x) =>
		expect(Math.abs(besselJ(0, x)[0])).toBeLessThan(5e-8)
	);
	it.each([3.831706, 7.0155867, 10.1734681])('has J1 = 0 at %f', (x) =>
		expect(Math.abs(besselJ(1, x)[1])).toBeLessThan(5e-8)
	);
	it('has J0 = J1 at 1.434696, |J0| = J2 and the greatest J1, 0.581865, at 1.841184, J1 = J2 at 2.629874', () => {
		const at = (x: number) => besselJ(2, x);
		expect(at(1.434696)[0]).toBeCloseTo(at(1.434696)[1], 6);
		expect(Math.abs(at(1.841184)[0])).toBeCloseTo(at(1.841184)[2], 6);
		expect(at(1.841184)[1]).toBeCloseTo(0.581865, 6);
		expect(at(2.629874)[1]).toBeCloseTo(at(2.629874)[2], 6);
	});
});

describe('frequency modulation', () => {
	// Computed from the first three nulls of J0: 75 kHz, 5 kHz and 2.5 kHz deviation.
	it.each([
		[75e3, 31.1873e3],
		[75e3, 13.5868e3],
		[75e3, 8.66679e3],
		[5e3, 2.07915e3],
		[2.5e3, 1.03958e3],
		[24.048e3, 10e3]
	])('of %f Hz by a tone of %f Hz has no carrier left: under −80 dBc', (deviationHz, modulatingHz) => {
		const carrierMw = powersOf(fmOf(deviationHz, modulatingHz)).get(0) ?? 0;
		expect(carrierMw).toBeLessThan(1e-8);
	});
	it('of 20 kHz by 10 kHz at 0 dBm shows −12.999, −4.781, −9.049, −17.792, −29.372 dBm (computed)', () => {
		const powers = powersOf(fmOf(20e3));
		[-12.999, -4.781, -9.049, -17.792, -29.372].forEach((level, n) => {
			expect(powerRatioToDb(powers.get(n * 10e3)!)).toBeCloseTo(level, 3);
			expect(powerRatioToDb(powers.get(-n * 10e3)!)).toBeCloseTo(level, 3);
		});
	});
	// Carson 1922 (from memory); computed.
	it.each([
		[1, 0.99922],
		[2, 0.99759],
		[5, 0.99356],
		[8, 0.9911],
		[10, 0.98996]
	])('of index %f holds %f of its power in Carson’s bandwidth', (index, share) => {
		let inside = 0;
		for (const [offsetHz, powerMw] of powersOf(fmOf(index * 10e3)))
			if (Math.abs(offsetHz) <= (index + 1) * 10e3) inside += powerMw;
		expect(inside).toBeCloseTo(share, 5);
	});
	it.each([
		[2, 3],
		[5, 6],
		[10, 12]
	])('of index %i needs %i pairs of lines for 99 in 100 of its power (computed)', (index, pairs) => {
		const powers = powersOf(fmOf(index * 10e3));
		const inside = (n: number) =>
			[...powers].reduce((sum, [offsetHz, mw]) => sum + (Math.abs(offsetHz) <= n * 10e3 ? mw : 0), 0);
		expect(inside(pairs)).toBeGreaterThanOrEqual(0.99);
		expect(inside(pairs - 1)).toBeLessThan(0.99);
	});
});

describe('narrowband phase modulation', () => {
	it('of 0.1 rad has sidebands at −26.0097 dBc and a second pair at −58.047 dBc; AM has no second pair (computed)', () => {
		const pm: EmitterOf<'pm'> = {
			kind: 'pm',
			frequencyHz: 1e8,
			levelDbm: 0,
			modulatingHz: 10e3,
			deviationRad: 0.1
		};
		const powers = powersOf(pm);
		const dbc = (offsetHz: number) => powerRatioToDb(powers.get(offsetHz)! / powers.get(0)!);
		expect(dbc(10e3)).toBeCloseTo(-26.0097, 4);
		expect(dbc(-20e3)).toBeCloseTo(-58.047, 3);
		expect(powersOf(amOf(0.1)).get(20e3)).toBeUndefined();
	});
});
