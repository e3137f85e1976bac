/**
 * Laws of extremes and averages of |noise + line|² over a stretch of length `bt` (in 1/B), through a Gaussian filter:
 * what a long bucket shows, without following it sample by sample. x and s are powers over the noise's mean; s is the line's.
 * Crossing rate after Rice (Bell Syst. Tech. J. 24, 46, 1945): 1.5054·B·√x·e^{−(√x−√s)²}·I₀e(2√(xs)), with 1.5054 = √(π/(2 ln 2)).
 * With its ends followed sample by sample a bucket of bt 8 shows 5.55 dB over the noise on average (Monte Carlo 5.55).
 */
import { IMPULSE_PER_RBW } from './resolution-filter';
import { besselI0Scaled, riceCdf } from './rice';

/**
 * ln P(no crossing above x within bt): the ends of the stretch are followed elsewhere, so only crossings count.
 * The rate is that of a process known to be below: divided by P(power < x).
 */
export function logBelow(x: number, s: number, bt: number): number {
	if (x <= 0) return -Infinity;
	if (s === 0) return (-IMPULSE_PER_RBW * bt * Math.sqrt(x)) / Math.expm1(x);
	const below = riceCdf(x, s);
	return below <= 0 ? -Infinity : -(crossingRate(x, s) * bt) / below;
}

/** ln P(no crossing below x within bt). */
export function logAbove(x: number, s: number, bt: number): number {
	if (s === 0) return -IMPULSE_PER_RBW * bt * Math.sqrt(x);
	const above = 1 - riceCdf(x, s);
	return above <= 0 ? -Infinity : -(crossingRate(x, s) * bt) / above;
}

/** Crossings of level x in one direction per 1/B. */
function crossingRate(x: number, s: number): number {
	const d = Math.sqrt(x) - Math.sqrt(s);
	return IMPULSE_PER_RBW * Math.sqrt(x) * Math.exp(-d * d) * besselI0Scaled(2 * Math.sqrt(x * s));
}

/** Least power of noise alone within bt, from a unit exponential draw: 1.5054·bt·√x = E. */
export function leastOfNoise(exponential: number, bt: number): number {
	const root = exponential / (IMPULSE_PER_RBW * bt);
	return root * root;
}

/** Greatest power of noise alone over bt as a function of −ln P, tabulated. */
export class GreatestOfNoise {
	private static readonly CELLS = 512;
	/** ln x at equal steps of ln(−ln P) from −40 (rarest) to 4. */
	private readonly table: Float64Array;

	/** Length the table was made for, in 1/B. Crossings only: any other length is a draw scaled in proportion. */
	private static readonly BT = 16;

	constructor() {
		let guess = Math.log(40);
		this.table = Float64Array.from({ length: GreatestOfNoise.CELLS + 1 }, (_, i) => {
			const target = -Math.exp(-40 + (44 * i) / GreatestOfNoise.CELLS);
			guess = solveLog((x) => logBelow(x, 0, GreatestOfNoise.BT), target, guess);
			return guess;
		});
	}

	/** @param exponential −ln P: a unit exponential draw */
	draw(exponential: number, bt: number): number {
		const at = ((Math.log((exponential * GreatestOfNoise.BT) / bt) + 40) / 44) * GreatestOfNoise.CELLS;
		const cell = Math.min(GreatestOfNoise.CELLS - 1, Math.max(0, Math.floor(at)));
		const blend = Math.min(1, Math.max(0, at - cell));
		return Math.exp(this.table[cell] + blend * (this.table[cell + 1] - this.table[cell]));
	}
}

/** Answers nearer than this (in ln x) are the same: 0.004 dB. */
const CLOSE = 1e-3;

/**
 * ln x at which a rising ln P(x) reaches `target`: secants on ln(−ln P), which is nearly straight there, inside a bracket
 * that bisects whenever a secant would leave it.
 */
export function solveLog(logP: (x: number) => number, target: number, guess: number): number {
	const miss = (y: number): number => Math.log(-logP(Math.exp(y)) / -target);
	let low = guess;
	let fLow = miss(low);
	let high = guess;
	let fHigh = fLow;
	// the miss falls as y rises: low keeps it above zero, high below
	for (let step = 0.3; !(fLow > 0) && low > -80; step *= 2) {
		high = low;
		fHigh = fLow;
		low -= step;
		fLow = miss(low);
	}
	for (let step = 0.3; !(fHigh < 0) && high < 80; step *= 2) {
		low = high;
		fLow = fHigh;
		high += step;
		fHigh = miss(high);
	}
	for (let i = 0; i < 40 && high - low > CLOSE; i++) {
		const secant = low + (fLow / (fLow - fHigh)) * (high - low);
		const y = i % 3 < 2 && secant > low && secant < high ? secant : (low + high) / 2;
		const f = miss(y);
		if (Math.abs(f) < CLOSE) return y;
		if (f > 0) {
			low = y;
			fLow = f;
		} else {
			high = y;
			fHigh = f;
		}
	}
	return (low + high) / 2;
}
