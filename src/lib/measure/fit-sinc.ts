/** The pulse width whose spectrum fits a set of amplitudes. */
import { minimise } from './minimise';

export interface SincFit {
	widthS: number;
	/** One standard deviation, from what the fit leaves over. */
	spreadS: number;
	/** Share of the amplitudes left over, 0 to 1. */
	residual: number;
}

/**
 * Least squares of A·|sin(πfτ)/(πfτ)| over τ, A solved for at each.
 * @param offsetsHz from the carrier, at least three
 * @param amplitudes linear, any unit
 * @param spanHz what the offsets cover: widths from a fifth of a lobe to fifty lobes in it are looked for
 */
export function fitSinc(offsetsHz: number[], amplitudes: number[], spanHz: number): SincFit {
	const leftOver = (logWidth: number): number => compare(offsetsHz, amplitudes, Math.exp(logWidth));
	const [first, last] = [Math.log(0.2 / spanHz), Math.log(50 / spanHz)];
	// 1.5 % a step: the many lobes of a wide pulse move by less than one of their own widths.
	const step = 0.015;
	let best = first;
	let least = leftOver(first);
	for (let at = first; at <= last; at += step) {
		const here = leftOver(at);
		if (here < least) [best, least] = [at, here];
	}
	const logWidth = minimise(leftOver, best - step, best + step);
	const widthS = Math.exp(logWidth);
	const residual = leftOver(logWidth);
	return { widthS, spreadS: widthS * logSpread(leftOver, logWidth, residual, amplitudes.length), residual };
}

/** r.m.s. share of the amplitudes that A·sinc leaves over. */
function compare(offsetsHz: number[], amplitudes: number[], widthS: number): number {
	let [products, squares, total] = [0, 0, 0];
	for (let i = 0; i < offsetsHz.length; i++) {
		const x = Math.PI * offsetsHz[i] * widthS;
		const model = Math.abs(x) < 1e-9 ? 1 : Math.abs(Math.sin(x) / x);
		products += amplitudes[i] * model;
		squares += model * model;
		total += amplitudes[i] * amplitudes[i];
	}
	return Math.sqrt(Math.max(0, 1 - products ** 2 / squares / total));
}

/** The sum of squares rises by s² = least/(n − 2) one deviation away: δ² = 2·s²/curvature, curvature by differences. */
function logSpread(
	leftOver: (logWidth: number) => number,
	at: number,
	residual: number,
	count: number
): number {
	const h = 0.01;
	const curvature = (leftOver(at + h) ** 2 - 2 * residual ** 2 + leftOver(at - h) ** 2) / (h * h);
	const variance = residual ** 2 / Math.max(1, count - 2);
	return curvature > 0 ? Math.min(1, Math.sqrt((2 * variance) / curvature)) : 1;
}
