import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lineOf } from '$lib/server/bench/signal/comb';
import { distort } from '$lib/server/bench/signal/nonlinearity';
import type { Line } from '$lib/server/bench/signal/emitter-kind';
import { dbmToMilliwatts, milliwattsToDbm } from '$lib/units/decibel';

const toiDbm = 10;
const toiMw = dbmToMilliwatts(toiDbm);
const at = (lines: Line[], frequencyHz: number): Line =>
	lines.find((line) => Math.abs(line.frequencyHz - frequencyHz) < 0.5) ?? { frequencyHz, re: 0, im: 0 };
const levelOf = (line: Line): number => milliwattsToDbm(line.re ** 2 + line.im ** 2);
const tones = (...levels: [number, number][]): Line[] =>
	levels.map(([frequencyHz, dbm], i) => lineOf(frequencyHz, dbmToMilliwatts(dbm), 0.5 + i));

describe('distort(lines, [], limits)', () => {
	it('gives the envelope of x − x|x|²/P_toi, line by line, as a sampled waveform does', () => {
		const lines = tones([1e9, -8], [1e9 + 3e3, -10], [1e9 + 10e3, -14]);
		const out = distort(lines, [], { toiDbm, shiDbm: null }).lines;
		const points = 128;
		const expected = new Map<number, Line>();
		for (let n = 0; n < points; n++) {
			// One period of 1 ms: every line is a whole number of kHz from 1 GHz.
			const t = n / points / 1e3;
			let [re, im] = [0, 0];
			for (const line of lines) {
				const turn = 2 * Math.PI * (line.frequencyHz - 1e9) * t;
				re += line.re * Math.cos(turn) - line.im * Math.sin(turn);
				im += line.re * Math.sin(turn) + line.im * Math.cos(turn);
			}
			const gain = 1 - (re * re + im * im) / toiMw;
			for (let k = -25; k <= 25; k++) {
				const turn = -2 * Math.PI * k * 1e3 * t;
				const frequencyHz = 1e9 + k * 1e3;
				const line = expected.get(k) ?? { frequencyHz, re: 0, im: 0 };
				line.re += (gain * (re * Math.cos(turn) - im * Math.sin(turn))) / points;
				line.im += (gain * (re * Math.sin(turn) + im * Math.cos(turn))) / points;
				expected.set(k, line);
			}
		}
		for (const line of expected.values()) {
			expect(at(out, line.frequencyHz).re).toBeCloseTo(line.re, 12);
			expect(at(out, line.frequencyHz).im).toBeCloseTo(line.im, 12);
		}
	});
	it('gives 2f at 2P−SHI, sums and differences 6.02 dB higher, 3f at 3P−2·TOI−9.54', () => {
		const { lines } = distort(tones([100e6, -30], [130e6, -40]), [], { toiDbm: 15, shiDbm: 45 });
		expect(levelOf(at(lines, 200e6))).toBeCloseTo(-105, 9);
		expect(levelOf(at(lines, 230e6))).toBeCloseTo(-115 + 6.0206, 4);
		expect(levelOf(at(lines, 30e6))).toBeCloseTo(-115 + 6.0206, 4);
		expect(levelOf(at(lines, 300e6))).toBeCloseTo(-120 - 9.5424, 4);
		expect(levelOf(at(lines, 70e6))).toBeCloseTo(2 * -30 - 40 - 30, 9);
	});
	it('turns products by the device’s phase and leaves compression as it is', () => {
		const input = tones([1e9, 0], [1.001e9, 0]);
		const straight = distort(input, [], { toiDbm, shiDbm: null }).lines;
		const turned = distort(input, [], { toiDbm, shiDbm: null, phaseRad: Math.PI / 2 }).lines;
		expect(at(turned, 1e9)).toEqual(at(straight, 1e9));
		expect(at(turned, 999e6).re).toBeCloseTo(-at(straight, 999e6).im, 12);
		expect(at(turned, 999e6).im).toBeCloseTo(at(straight, 999e6).re, 12);
	});
	it('keeps the input lines in front, in their order, and names the parents of the new ones', () => {
		const { lines } = distort(tones([1.001e9, -20], [1e9, -10]), [], { toiDbm, shiDbm: null });
		expect(lines.slice(0, 2).map((line) => line.frequencyHz)).toEqual([1.001e9, 1e9]);
		expect([...lines.find((line) => line.frequencyHz === 999e6)!.parents!].sort()).toEqual([0, 1, 1]);
	});
	it('lets the 64 strongest lines make products, and all of them through', () => {
		const lines = tones(
			...Array.from({ length: 64 }, (_, i): [number, number] => [1e9 + i * 1e6 + i * i * 1e3, -40]),
			[2.5e9, -41]
		);
		const out = distort(lines, [], { toiDbm: null, shiDbm: 40 }).lines;
		expect(levelOf(at(out, 2.5e9))).toBeCloseTo(-41, 9);
		expect(levelOf(at(out, 2e9))).toBeCloseTo(-120, 9);
		expect(at(out, 5e9)).toEqual({ frequencyHz: 5e9, re: 0, im: 0 });
	});
	it('drops products under the floor after adding those of equal frequency', () => {
		const limits = { toiDbm: 15, shiDbm: null, floorDbm: -100 };
		const comb = tones(...[0, 1, 2, 3].map((i): [number, number] => [1e9 + i * 1e6, -24]));
		const { lines } = distort(comb, [], limits);
		expect(lines.every((line, i) => i < 4 || levelOf(line) >= -100)).toBe(true);
		// 2·f₃ − f₁ alone is at −102, but f₃ + f₂ − f₀ falls on the same spot.
		expect(levelOf(at(lines, 1.005e9))).toBeGreaterThan(-100);
		expect(at(lines, 1.006e9).re).toBe(0);
	});
	it('never gives more than the greatest output, however strong the line', () =>
		fc.assert(
			fc.property(fc.double({ min: -50, max: 60, noNaN: true }), (dbm) => {
				const [line] = distort(tones([1e9, dbm]), [], { toiDbm, shiDbm: null }).lines;
				expect(levelOf(line)).toBeLessThanOrEqual(toiDbm + 10 * Math.log10(4 / 27) + 1e-9);
			})
		));
	it('without limits changes nothing', () => {
		const lines = tones([1e9, 10], [1.1e9, 20]);
		expect(distort(lines, [], { toiDbm: null, shiDbm: null }).lines).toEqual(lines);
	});
});
