/** Regrowth against brute force: the cubic applied to sampled waveforms, spectra by averaged periodograms. */
import FFT from 'fft.js';
import seedrandom from 'seedrandom';
import { describe, expect, it } from 'vitest';
import type { EmitterOf } from '$lib/schemas/scene';
import { lineOf } from '$lib/server/bench/signal/comb';
import type { Density, Line } from '$lib/server/bench/signal/emitter-kind';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { distort } from '$lib/server/bench/signal/nonlinearity';
import { constellation, rrcPulse } from '$lib/server/bench/signal/waveform';
import { waveformKurtosis, waveformMoments } from '$lib/server/bench/signal/waveform-moments';
import { dbmToMilliwatts, powerRatioToDb } from '$lib/units/decibel';

const centreHz = 1e9;
const sampleRateHz = 8e6;
const points = 4096;
const toiDbm = 10;
const toiMw = dbmToMilliwatts(toiDbm);
const limits = { toiDbm, shiDbm: null };

const noiseOf = (offsetHz: number, widthHz: number, levelDbm: number): EmitterOf<'noise'> => ({
	kind: 'noise',
	densityDbmPerHz: levelDbm - powerRatioToDb(widthHz),
	startHz: centreHz + offsetHz - widthHz / 2,
	stopHz: centreHz + offsetHz + widthHz / 2
});
const digitalOf = (order: EmitterOf<'digital'>['order'], levelDbm: number): EmitterOf<'digital'> => ({
	kind: 'digital',
	frequencyHz: centreHz,
	levelDbm,
	symbolRateHz: 1e6,
	rollOff: 0.22,
	order
});

/** Mean of |spectrum|² per bin of x − x|x|²/P_toi less `gain`·x over `records` periodic records. */
function residualSpectrum(records: number, record: (n: number) => Float64Array, gain: number): Float64Array {
	const fft = new FFT(points);
	const sum = new Float64Array(points);
	const out = fft.createComplexArray();
	for (let n = 0; n < records; n++) {
		const x = record(n);
		for (let i = 0; i < x.length; i += 2) {
			const factor = 1 - (x[i] ** 2 + x[i + 1] ** 2) / toiMw - gain;
			x[i] *= factor;
			x[i + 1] *= factor;
		}
		fft.transform(out, x);
		for (let k = 0; k < points; k++)
			sum[k] += (out[2 * k] ** 2 + out[2 * k + 1] ** 2) / points ** 2 / records;
	}
	return sum;
}

/** Power of bins from `fromHz` to `toHz` off the centre, mW. */
function powerIn(spectrum: Float64Array, fromHz: number, toHz: number): number {
	const bin = sampleRateHz / points;
	let sum = 0;
	for (let k = Math.ceil(fromHz / bin); k < toHz / bin; k++) sum += spectrum[(k + points) % points];
	return sum;
}
const regrowthIn = (densities: Density[], inputs: number, fromHz: number, toHz: number): number =>
	densities
		.slice(inputs)
		.reduce(
			(sum, d) => sum + d.powerMw * (d.cumulative(centreHz + toHz) - d.cumulative(centreHz + fromHz)),
			0
		);

function gaussianRecords(emitters: EmitterOf<'noise'>[], lines: Line[] = []): (n: number) => Float64Array {
	const draw = seedrandom('regrowth');
	const fft = new FFT(points);
	const bin = sampleRateHz / points;
	const densities = emitters.map((emitter) => kindOf(emitter).density!(emitter));
	const powers = Float64Array.from({ length: points }, (_, i) =>
		densities.reduce((sum, d) => sum + d.densityMwPerHz(centreHz + (i + 0.5 - points / 2) * bin) * bin, 0)
	);
	return () => {
		const spectrum = new Float64Array(2 * points);
		for (let k = -points / 2; k < points / 2; k++) {
			const mw = powers[k + points / 2];
			if (mw === 0) continue;
			const radius = Math.sqrt(-mw * Math.log(1 - draw()));
			const angle = 2 * Math.PI * draw();
			const at = 2 * ((k + points) % points);
			spectrum[at] = points * radius * Math.cos(angle);
			spectrum[at + 1] = points * radius * Math.sin(angle);
		}
		for (const line of lines) {
			const at = 2 * ((Math.round((line.frequencyHz - centreHz) / bin) + points) % points);
			spectrum[at] += points * line.re;
			spectrum[at + 1] += points * line.im;
		}
		const x = new Float64Array(2 * points);
		fft.inverseTransform(x, spectrum);
		return x;
	};
}

function digitalRecords({ order, levelDbm, rollOff }: EmitterOf<'digital'>): (n: number) => Float64Array {
	const draw = seedrandom('symbols');
	const { re, im } = constellation(order);
	const { taps, perSymbol, halfSymbols } = rrcPulse(rollOff);
	const perSample = perSymbol / 8;
	const amplitude = Math.sqrt(dbmToMilliwatts(levelDbm));
	return () => {
		const x = new Float64Array(2 * points);
		for (let symbol = 0; symbol < points / 8; symbol++) {
			const i = Math.floor(draw() * order);
			for (let tap = 0; tap < taps.length; tap += perSample) {
				// The record is one turn of a ring, so that its spectrum has no edges.
				const n = (symbol * 8 + tap / perSample - halfSymbols * 8 + points) % points;
				x[2 * n] += amplitude * re[i] * taps[tap];
				x[2 * n + 1] += amplitude * im[i] * taps[tap];
			}
		}
		return x;
	};
}

describe('distort([], densities, limits)', () => {
	it('of band noise at −10 dBm grows what the sampled cubic grows, beside and under the band', () => {
		const emitter = noiseOf(0, 1e6, -10);
		const { densities } = distort([], [kindOf(emitter).density!(emitter)], limits);
		const gain = 1 - (2 * dbmToMilliwatts(-10)) / toiMw;
		const spectrum = residualSpectrum(200, gaussianRecords([emitter]), gain);
		for (const [from, to] of [
			[-0.4e6, 0.4e6],
			[0.6e6, 0.9e6],
			[-1.3e6, -1e6]
		]) {
			const ratio = regrowthIn(densities, 1, from, to) / powerIn(spectrum, from, to);
			expect(Math.abs(powerRatioToDb(ratio))).toBeLessThan(0.15);
		}
		expect(densities[0].powerMw).toBeCloseTo(dbmToMilliwatts(-10) * gain ** 2, 12);
	});
	it('of two bands grows at 2f₁−f₂ and in the bands as the sampled cubic does', () => {
		const emitters = [noiseOf(-0.6e6, 0.4e6, -10), noiseOf(0.7e6, 0.2e6, -13)];
		const inputs = emitters.map((emitter) => kindOf(emitter).density!(emitter));
		const { densities } = distort([], inputs, limits);
		const gain = 1 - (2 * (inputs[0].powerMw + inputs[1].powerMw)) / toiMw;
		const spectrum = residualSpectrum(800, gaussianRecords(emitters), gain);
		for (const [from, to] of [
			[-2.2e6, -1.6e6],
			[-0.8e6, -0.4e6],
			[0.6e6, 0.8e6],
			[1.8e6, 2.2e6]
		]) {
			const ratio = regrowthIn(densities, 2, from, to) / powerIn(spectrum, from, to);
			expect(Math.abs(powerRatioToDb(ratio))).toBeLessThan(0.2);
		}
	});
	it.each([4, 16, 2, 64] as const)('of order-%i symbols grows the real waveform’s neighbours', (order) => {
		const emitter = digitalOf(order, -10);
		const { densities } = distort([], [kindOf(emitter).density!(emitter)], limits);
		const gain = 1 - (waveformKurtosis(order, 0.22) * dbmToMilliwatts(-10)) / toiMw;
		const spectrum = residualSpectrum(150, digitalRecords(emitter), gain);
		for (const [from, to] of [
			[-0.3e6, 0.3e6],
			[0.65e6, 1e6],
			[-1.5e6, -1.1e6]
		]) {
			const ratio = regrowthIn(densities, 1, from, to) / powerIn(spectrum, from, to);
			expect(Math.abs(powerRatioToDb(ratio))).toBeLessThan(0.25);
		}
	});
	// bench.md §4: ratio to Gaussian at roll-off 0.22, near the band and far from it.
	it.each([
		[4, -7.2, -5.2],
		[16, -5.2, -2.9]
	] as const)(
		'of order %i stands %f dB under Gaussian regrowth near the band, %f dB far from it',
		(order, near, far) => {
			const { residual, plain } = waveformMoments(order, 0.22);
			const power = (correlation: Float64Array, from: number, to: number) => {
				let sum = 0;
				for (let f = from; f < to; f += 0.005)
					correlation.forEach((value, n) => {
						sum += (n === 0 ? 1 : 2) * value * Math.cos((2 * Math.PI * f * n) / 8);
					});
				return sum;
			};
			const gaussian = plain.map((value) => 2 * value ** 3);
			const ratio = (from: number, to: number) =>
				powerRatioToDb(power(residual, from, to) / power(gaussian, from, to));
			expect(Math.abs(ratio(0.65, 0.8) - near)).toBeLessThan(0.3);
			expect(Math.abs(ratio(1, 1.25) - far)).toBeLessThan(0.9);
		}
	);
	it('of a constant envelope grows nothing: only its gain falls', () => {
		const emitter: EmitterOf<'msk'> = { kind: 'msk', frequencyHz: 1e9, levelDbm: 0, bitRateHz: 1e6 };
		const { densities } = distort([], [kindOf(emitter).density!(emitter)], limits);
		const grown = densities.slice(1).reduce((sum, d) => sum + d.powerMw, 0);
		expect(grown).toBeLessThan(1e-6 * densities[0].powerMw);
		expect(densities[0].powerMw).toBeCloseTo((1 - 1 / toiMw) ** 2, 9);
	});
});

describe('distort(lines, densities, limits)', () => {
	it('of a line and band noise grows around the line and in its mirror as the sampled cubic does', () => {
		const emitter = noiseOf(0.4e6, 0.3e6, -14);
		const bin = sampleRateHz / points;
		const line = lineOf(centreHz - 200 * bin, dbmToMilliwatts(-8), 0.4);
		const { densities, lines } = distort([line], [kindOf(emitter).density!(emitter)], limits);
		const lineMw = dbmToMilliwatts(-8);
		const noiseMw = dbmToMilliwatts(-14);
		const gain = 1 - (2 * (lineMw + noiseMw)) / toiMw;
		const spectrum = residualSpectrum(300, gaussianRecords([emitter], [line]), gain);
		// The line's own gain differs from the noise's: leave its bin out.
		spectrum[points - 200] = spectrum[points - 201];
		for (const [from, to] of [
			[-0.65e6, -0.15e6],
			[-1.4e6, -0.9e6],
			[0.9e6, 1.5e6]
		]) {
			const ratio = regrowthIn(densities, 1, from, to) / powerIn(spectrum, from, to);
			expect(Math.abs(powerRatioToDb(ratio))).toBeLessThan(0.25);
		}
		expect(Math.sqrt(lines[0].re ** 2 + lines[0].im ** 2)).toBeCloseTo(
			Math.sqrt(lineMw) * (1 - (lineMw + 2 * noiseMw) / toiMw),
			9
		);
		expect(densities[1].parents).toEqual({ densities: [0], lines: [0] });
	});
	it('of two lines and band noise grows copies a line’s distance away as the sampled cubic does', () => {
		const emitter = noiseOf(0, 0.2e6, -16);
		const bin = sampleRateHz / points;
		const line = (k: number) => lineOf(centreHz + k * bin, dbmToMilliwatts(-10), k);
		const lines = [line(-500), line(-120)];
		const { densities } = distort(lines, [kindOf(emitter).density!(emitter)], limits);
		const gain = 1 - (2 * (2 * dbmToMilliwatts(-10) + dbmToMilliwatts(-16))) / toiMw;
		const spectrum = residualSpectrum(300, gaussianRecords([emitter], lines), gain);
		// Copies at ±380 bins and the mirror at −620; lines' own products are whole bins, left out.
		for (const k of [-880, 260, -500, -120]) spectrum[(k + points) % points] = 0;
		for (const k of [380, -380, -620]) {
			const [from, to] = [(k - 30) * bin, (k + 30) * bin];
			const ratio = regrowthIn(densities, 1, from, to) / powerIn(spectrum, from, to);
			expect(Math.abs(powerRatioToDb(ratio))).toBeLessThan(0.3);
		}
	});
	it('remembers by content: an attenuator in front only scales', () => {
		const emitter = noiseOf(0, 1e6, -10);
		const through = (levelDbm: number) => {
			const scaled = { ...emitter, densityDbmPerHz: emitter.densityDbmPerHz + levelDbm };
			return distort([], [kindOf(scaled).density!(scaled)], limits).densities[1];
		};
		expect(powerRatioToDb(through(0).powerMw / through(-5).powerMw)).toBeCloseTo(15, 9);
	});
});
