/** The spectrum that a cubic stage adds to a linearly modulated signal, from the moments of its real waveform. */
import FFT from 'fft.js';
import { MOMENT_PHASES, waveformMoments, type Order } from './waveform-moments';

/** Table points over the eight symbol rates that sampling at eight a symbol spans: 1/512 symbol rate apart. */
const POINTS = 4096;

const prepared = new Map<string, (frequencyPerRate: number) => number>();

/**
 * Spectrum of x|x|² − κx for unit mean power and unit symbol rate, against distance from the carrier in symbol rates.
 * Times P³/P_toi² over the symbol rate it is the regrowth. For a Gaussian signal of the same spectrum it would be
 * 2(S∗S∗S̃): what bench.md calls the ratio to Gaussian is this over that.
 */
export function waveformRegrowth(order: Order, rollOff: number): (frequencyPerRate: number) => number {
	const key = `${order} ${rollOff}`;
	let regrowth = prepared.get(key);
	if (!regrowth) {
		if (prepared.size >= 64) prepared.clear();
		regrowth = tableOf(waveformMoments(order, rollOff).residual, 1.5 * (1 + rollOff));
		prepared.set(key, regrowth);
	}
	return regrowth;
}

/** Spectrum of an even autocorrelation sampled at n/8, straight between points, nothing beyond `reach`. */
function tableOf(correlation: Float64Array, reach: number): (frequencyPerRate: number) => number {
	const even = new Float64Array(2 * POINTS);
	for (let n = 0; n < correlation.length; n++)
		even[2 * n] = (correlation[n] * (n === 0 ? 1 : 2)) / MOMENT_PHASES;
	const fft = new FFT(POINTS);
	const spectrum = fft.createComplexArray();
	fft.transform(spectrum, even);
	const step = MOMENT_PHASES / POINTS;
	const at = (i: number): number => Math.max(0, spectrum[2 * i]);
	return (frequencyPerRate) => {
		const f = Math.abs(frequencyPerRate);
		if (f >= reach) return 0;
		const i = Math.floor(f / step);
		return at(i) + (at(i + 1) - at(i)) * (f / step - i);
	};
}
