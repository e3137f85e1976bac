/** Gaussian minimum-shift keying: no closed spectrum, but an autocorrelation of finite length. */
import FFT from 'fft.js';
import type { UnitSpectrum } from './msk-spectrum';
import { mskPhase } from './waveform';

/** Samples of the autocorrelation per bit: the spectrum is made out to ±32 bit rates. */
const PER_BIT = 64;
/** Spacing of the spectrum's table is PER_BIT/POINTS = 1/512 bit rate. */
const POINTS = 32768;
const REACH = 24;
/** Instants a bit over which the autocorrelation is averaged: the narrower the filter, the smoother it is. */
const instantsPerBit = (bt: number): number => (bt < 0.5 ? 16 : PER_BIT);

/**
 * Spectrum behind a Gaussian filter of bandwidth `bt` × bit rate. With independent bits the autocorrelation is
 * R(τ) = mean over t of Π cos(Δq_k), Δq_k what bit k turns the phase between t and t + τ; it vanishes once a whole bit
 * lies in between, for that one turns by π/2. The spectrum and its integral are cosine and sine sums of R (exact but for
 * what lies beyond ±32 bit rates), kept at 1/512 bit rate and joined by cubics that match value and slope.
 */
export function gmskSpectrum(bt: number): UnitSpectrum {
	const correlation = autocorrelation(bt);
	const stepBits = 1 / PER_BIT;
	const even = new Float64Array(2 * POINTS);
	const odd = new Float64Array(2 * POINTS);
	for (let n = 0; n < correlation.length; n++) {
		even[2 * n] = correlation[n] * (n === 0 ? 0.5 : 1);
		odd[2 * n] = n === 0 ? 0 : correlation[n] / (n * stepBits);
	}
	const fft = new FFT(POINTS);
	const cosines = fft.createComplexArray();
	const sines = fft.createComplexArray();
	fft.transform(cosines, even);
	fft.transform(sines, odd);
	const step = PER_BIT / POINTS;
	const density = new Float64Array(REACH / step + 2);
	const above = new Float64Array(density.length);
	for (let m = 0; m < density.length; m++) {
		density[m] = Math.max(0, 2 * stepBits * cosines[2 * m]);
		above[m] = (stepBits / Math.PI) * (Math.PI * m * step * correlation[0] - sines[2 * m + 1]);
	}
	const last = density.length - 1;
	/** Cubic through the areas at both ends of a step with the densities as its slopes: its value. */
	const areaAt = (frequencyPerRate: number): number => {
		const x = Math.abs(frequencyPerRate) / step;
		const m = Math.floor(x);
		if (m >= last) return 0.5;
		const s = x - m;
		const rise = above[m + 1] - above[m];
		const a = step * density[m] - rise;
		const b = rise - step * density[m + 1];
		return above[m] + s * rise + s * (1 - s) * (a * (1 - s) + b * s);
	};
	/** Its slope. */
	const slopeAt = (frequencyPerRate: number): number => {
		const x = Math.abs(frequencyPerRate) / step;
		const m = Math.floor(x);
		if (m >= last) return 0;
		const s = x - m;
		const rise = above[m + 1] - above[m];
		const a = step * density[m] - rise;
		const b = rise - step * density[m + 1];
		return (rise + (1 - 2 * s) * (a * (1 - s) + b * s) + s * (1 - s) * (b - a)) / step;
	};
	return {
		density: (frequencyPerRate) => Math.max(0, slopeAt(frequencyPerRate)),
		below: (frequencyPerRate) => {
			const half = Math.min(0.5, areaAt(frequencyPerRate));
			return frequencyPerRate >= 0 ? 0.5 + half : 0.5 - half;
		},
		reachPerBit: REACH
	};
}

/** R(n/PER_BIT) for n = 0 … until it vanishes. */
function autocorrelation(bt: number): Float64Array {
	const { perBit, halfBits, q } = mskPhase(bt);
	const stride = perBit / PER_BIT;
	const middle = halfBits * perBit;
	const phase = (n: number) => q[Math.min(q.length - 1, Math.max(0, n * stride + middle))];
	const lags = Math.ceil((2 * halfBits + 1) * PER_BIT);
	const reach = Math.ceil(halfBits);
	const instants = instantsPerBit(bt);
	return Float64Array.from({ length: lags + 1 }, (_, lag) => {
		let sum = 0;
		for (let t = 0; t < PER_BIT; t += PER_BIT / instants) {
			let product = 1;
			const last = Math.ceil((t + lag) / PER_BIT) + reach;
			for (let k = -reach; k <= last && product !== 0; k++)
				product *= Math.cos(phase(t + lag - k * PER_BIT) - phase(t - k * PER_BIT));
			sum += product;
		}
		return sum / instants;
	});
}
