/** Power spectrum of minimum-shift keying, with and without a Gaussian pre-filter; frequency in bit rates, area 1. */
import { gmskSpectrum } from './gmsk-spectrum';
import { cosineIntegralEntire, sineIntegral } from './sine-integral';

export interface UnitSpectrum {
	density(frequencyPerRate: number): number;
	/** Area below, 0 to 1. */
	below(frequencyPerRate: number): number;
	/** All but 1e-9 of the area lies within ± this. */
	reachPerBit: number;
}

/** S(f) = (16/π²)·[cos 2πf/(1 − 16f²)]² (Amoroso 1980; from memory, confirmed by its 99 % bandwidth 1.1818). */
const plainMsk: UnitSpectrum = {
	density(frequencyPerRate) {
		const u = 4 * Math.abs(frequencyPerRate);
		// cos(πu/2)/(1 − u²) = sin(π(1−u)/2)/((1−u)(1+u)), and π/4 at u = 1
		const v = 1 - u;
		const quotient = Math.abs(v) < 1e-8 ? Math.PI / 2 : Math.sin((Math.PI * v) / 2) / v;
		return (16 / Math.PI ** 2) * (quotient / (1 + u)) ** 2;
	},
	below(frequencyPerRate) {
		const u = 4 * frequencyPerRate;
		// 1/(1−u²)² in partial fractions leaves ∫sin²(πv/2)/v² and ∫sin²(πv/2)/v at v = 1 ± u.
		const square = (v: number) =>
			(Math.abs(v) < 1e-12 ? 0 : -(Math.sin((Math.PI * v) / 2) ** 2) / v) +
			(Math.PI / 2) * sineIntegral(Math.PI * v);
		const simple = (v: number) => cosineIntegralEntire(Math.PI * v) / 2;
		const area = square(1 + u) - square(1 - u) + simple(1 + u) - simple(1 - u);
		return 0.5 + area / Math.PI ** 2;
	},
	// The tail beyond f holds 1/(48π²f³).
	reachPerBit: 130
};

const prepared = new Map<number, UnitSpectrum>();

/** Spectrum without `bt`, or behind a Gaussian filter of bandwidth bt × bit rate. */
export function mskSpectrum(bt?: number): UnitSpectrum {
	if (bt === undefined) return plainMsk;
	let spectrum = prepared.get(bt);
	if (!spectrum) {
		if (prepared.size >= 64) prepared.clear();
		spectrum = gmskSpectrum(bt);
		prepared.set(bt, spectrum);
	}
	return spectrum;
}
