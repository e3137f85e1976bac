/** What a nonlinear stage makes of lines: every product of second and third order, those of equal frequency added. */
import type { Line } from './emitter-kind';

export interface ProductLine extends Line {
	/** Indices of the input lines of its strongest part; absent on an input line. */
	parents?: number[];
}

export interface ProductLaws {
	/** 10^(TOI/10), mW; null: no third order. */
	toiMw: number | null;
	/** 10^(SHI/10), mW; null: no second order. */
	shiMw: number | null;
	/** Turns every product against the lines it was made of. */
	phaseRad: number;
	/** Products weaker than this are dropped, after adding those of equal frequency. */
	floorMw: number;
}

/** Frequencies closer than this are one, Hz. */
const SAME_HZ = 1e-3;
/** A single product this far under the floor can't matter in a sum, as a power ratio. */
const HOPELESS = 1e-5;

/**
 * Adds the products of `entering` (indices into `lines`) to `lines`. On the complex envelope y = x − x|x|²/P_toi, a real
 * passband x² term and a third-harmonic term x³/3; so with powers in dBm: 2f₁−f₂ at 2P₁+P₂−2·TOI, three different lines
 * 6.02 dB more, 3f at 3P−2·TOI−9.54, 2f at 2P−SHI, f₁±f₂ at P₁+P₂−SHI+6.02. Parts that fall back on a line of their own
 * (compression) are not products: the caller's gain has them.
 * @returns `lines` with what fell on them, then the new ones
 */
export function addLineProducts(lines: Line[], entering: number[], laws: ProductLaws): ProductLine[] {
	const sum = new ProductSum(lines, entering, laws);
	for (let i = 0; i < sum.entered; i++) {
		for (let j = i; j < sum.entered; j++) {
			const pair = sum.pair(i, j);
			if (laws.shiMw !== null) addSecondOrder(sum, pair, laws.shiMw);
			if (laws.toiMw !== null) addThirdOrder(sum, pair, laws.toiMw);
		}
	}
	return sum.lines();
}

/** Two entered lines multiplied. */
interface Pair extends Line {
	i: number;
	j: number;
	/** How many times the pair occurs in a square. */
	ways: number;
}

function addSecondOrder(sum: ProductSum, { i, j, ways, re, im, frequencyHz }: Pair, shiMw: number): void {
	const gain = ways / Math.sqrt(shiMw);
	sum.add(frequencyHz, gain * re, gain * im, i, j, -1);
	if (i !== j) sum.addDifference(i, j, gain);
}

function addThirdOrder(sum: ProductSum, { i, j, ways, re, im, frequencyHz }: Pair, toiMw: number): void {
	const { res, ims, frequencies } = sum;
	const gain = -ways / toiMw;
	const enough = (sum.hopelessMw * toiMw * toiMw) / (9 * ways * ways * (re * re + im * im));
	// Strongest first: when one third line is too weak, so are all that follow.
	for (let k = 0; k < sum.entered && sum.powers[k] >= enough; k++) {
		if (k !== i && k !== j) {
			const productRe = gain * (re * res[k] + im * ims[k]);
			const productIm = gain * (im * res[k] - re * ims[k]);
			sum.add(frequencyHz - frequencies[k], productRe, productIm, i, j, k);
		}
		if (k < j) continue;
		// Each unordered triple once: x³/3 has weights 1/3, 1 and 2.
		const weight = (i === j && j === k ? 1 / 3 : i === j || j === k ? 1 : 2) / -toiMw;
		const productRe = weight * (re * res[k] - im * ims[k]);
		const productIm = weight * (re * ims[k] + im * res[k]);
		sum.add(frequencyHz + frequencies[k], productRe, productIm, i, j, k);
	}
}

/** The lines that enter, strongest first, and the products so far by frequency. */
class ProductSum {
	readonly entered: number;
	readonly res: Float64Array;
	readonly ims: Float64Array;
	readonly powers: Float64Array;
	readonly frequencies: Float64Array;
	readonly hopelessMw: number;
	private readonly order: number[];
	private readonly all: (ProductLine & { strongest: number })[];
	private readonly byFrequency = new Map<number, number>();
	private readonly turnRe: number;
	private readonly turnIm: number;

	constructor(
		private readonly inputs: Line[],
		entering: number[],
		private readonly laws: ProductLaws
	) {
		this.order = [...entering].sort((a, b) => powerOf(inputs[b]) - powerOf(inputs[a]));
		this.entered = this.order.length;
		this.res = Float64Array.from(this.order, (i) => inputs[i].re);
		this.ims = Float64Array.from(this.order, (i) => inputs[i].im);
		this.powers = Float64Array.from(this.order, (i) => powerOf(inputs[i]));
		this.frequencies = Float64Array.from(this.order, (i) => inputs[i].frequencyHz);
		this.hopelessMw = laws.floorMw * HOPELESS;
		this.turnRe = Math.cos(laws.phaseRad);
		this.turnIm = Math.sin(laws.phaseRad);
		this.all = inputs.map((line) => ({ ...line, strongest: Infinity }));
		inputs.forEach((line, i) => {
			const key = Math.round(line.frequencyHz / SAME_HZ);
			if (!this.byFrequency.has(key)) this.byFrequency.set(key, i);
		});
	}

	pair(i: number, j: number): Pair {
		const { res, ims, frequencies } = this;
		return {
			i,
			j,
			ways: i === j ? 1 : 2,
			frequencyHz: frequencies[i] + frequencies[j],
			re: res[i] * res[j] - ims[i] * ims[j],
			im: res[i] * ims[j] + ims[i] * res[j]
		};
	}

	addDifference(i: number, j: number, gain: number): void {
		const { res, ims, frequencies } = this;
		const re = gain * (res[i] * res[j] + ims[i] * ims[j]);
		const im = gain * (ims[i] * res[j] - res[i] * ims[j]);
		this.add(frequencies[i] - frequencies[j], re, im, i, j, -1);
	}

	/** Adds one product, before its turn, of the entered lines i, j and k (−1: none). */
	add(frequencyHz: number, re: number, im: number, i: number, j: number, k: number): void {
		const power = re * re + im * im;
		if (power < this.hopelessMw) return;
		// A real waveform shows a negative frequency as its mirror image.
		const mirror = frequencyHz < 0 ? -1 : 1;
		const turnedRe = re * this.turnRe - im * this.turnIm;
		const turnedIm = mirror * (re * this.turnIm + im * this.turnRe);
		const key = Math.round((mirror * frequencyHz) / SAME_HZ);
		const known = this.byFrequency.get(key);
		if (known === undefined) {
			this.byFrequency.set(key, this.all.length);
			this.all.push({
				frequencyHz: mirror * frequencyHz,
				re: turnedRe,
				im: turnedIm,
				parents: this.parents(i, j, k),
				strongest: power
			});
			return;
		}
		const line = this.all[known];
		line.re += turnedRe;
		line.im += turnedIm;
		if (power > line.strongest) {
			line.strongest = power;
			line.parents = this.parents(i, j, k);
		}
	}

	private parents(i: number, j: number, k: number): number[] {
		return (k < 0 ? [i, j] : [i, j, k]).map((entered) => this.order[entered]);
	}

	lines(): ProductLine[] {
		return this.all
			.filter((line, i) => i < this.inputs.length || powerOf(line) >= this.laws.floorMw)
			.map(({ strongest: _, ...line }) => line);
	}
}

const powerOf = (line: Line): number => line.re * line.re + line.im * line.im;
