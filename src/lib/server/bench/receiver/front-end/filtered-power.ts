/**
 * Power of densities through the resolution filter against the frequency it is tuned to: V(f) = ∫S(f′)·|H(f − f′)|² df′.
 * Kept on a lattice of B/8 that grows where it is asked for, so a sweep of any width costs what it looks at.
 */
import { gaussianConstant } from '../resolution-filter';

/** Part of a spectrum, known by the power it holds between any two frequencies. */
export interface SpectrumPart {
	startHz: number;
	stopHz: number;
	/** Frequencies at which the density jumps or bends. */
	breaksHz: readonly number[];
	/** Power between two frequencies near each other (within B/8), mW. */
	powerMw(fromHz: number, toHz: number): number;
}

/** Lattice steps in one resolution bandwidth. */
const STEPS_PER_RBW = 8;
/** Steps on each side that the filter still sees: ±4 B, −193 dB. */
const REACH = 4 * STEPS_PER_RBW;
/** Nodes that a block needs beyond its own for cubic interpolation: one before, two after. */
const BEFORE = 1;
const AFTER = 2;
/** Five-point Gauss–Legendre rule on −1…1. */
const GAUSS: [number, number][] = [
	[-0.906179845938664, 0.236926885056189],
	[-0.538469310105683, 0.478628670499366],
	[0, 0.568888888888889],
	[0.538469310105683, 0.478628670499366],
	[0.906179845938664, 0.236926885056189]
];

export class FilteredPower {
	private readonly stepHz: number;
	private readonly blockSize: number;
	private readonly exponent: number;
	private readonly kernel: Float64Array;
	private readonly blocks = new Map<number, Float64Array | null>();
	private readonly scratch: Float64Array;

	/**
	 * @param floorMw power against which nothing smaller matters, mW, greater than 0: steadies the interpolation of logarithms
	 * @param spacingHz distance between the frequencies that will be asked for: sizes the blocks, nothing else
	 */
	constructor(
		private readonly parts: readonly SpectrumPart[],
		rbwHz: number,
		private readonly floorMw: number,
		private readonly originHz: number,
		spacingHz: number
	) {
		this.stepHz = rbwHz / STEPS_PER_RBW;
		this.exponent = 2 * gaussianConstant(rbwHz);
		this.blockSize = spacingHz > 4 * rbwHz ? 8 : 256;
		this.scratch = new Float64Array(this.blockSize + BEFORE + AFTER + 2 * REACH);
		this.kernel = Float64Array.from({ length: 2 * REACH + 1 }, (_, i) =>
			this.meanGain((i - REACH - 0.5) * this.stepHz, (i - REACH + 0.5) * this.stepHz)
		);
	}

	/** Power through the filter tuned to `frequencyHz`, mW. */
	at(frequencyHz: number): number {
		const place = (frequencyHz - this.originHz) / this.stepHz;
		const node = Math.floor(place);
		const index = Math.floor(node / this.blockSize);
		let block = this.blocks.get(index);
		if (block === undefined) {
			block = this.makeBlock(index * this.blockSize - BEFORE);
			this.blocks.set(index, block);
		}
		if (block === null) return 0;
		const i = node - index * this.blockSize + BEFORE;
		const x = place - node;
		// Lagrange's cubic through the logarithms: a Gaussian skirt is a parabola there.
		const log =
			((x * (x - 1) * (2 - x)) / 6) * block[i - 1] +
			(((x + 1) * (x - 1) * (x - 2)) / 2) * block[i] +
			((x * (x + 1) * (2 - x)) / 2) * block[i + 1] +
			((x * (x + 1) * (x - 1)) / 6) * block[i + 2];
		return Math.max(0, Math.exp(log) - this.floorMw);
	}

	/** Logarithms of V + floor at nodes `first` …, or null where no density reaches. */
	private makeBlock(first: number): Float64Array | null {
		const nodes = this.blockSize + BEFORE + AFTER;
		const fromHz = this.originHz + (first - REACH - 0.5) * this.stepHz;
		const toHz = this.originHz + (first + nodes + REACH - 0.5) * this.stepHz;
		const here = this.parts.filter((part) => part.stopHz > fromHz && part.startHz < toHz);
		if (here.length === 0) return null;
		const power = new Float64Array(nodes);
		const cells = this.scratch.fill(0);
		for (const part of here) this.fillCells(part, cells, power, fromHz);
		for (let n = 0; n < nodes; n++) {
			let sum = power[n];
			for (let k = 0; k <= 2 * REACH; k++) sum += cells[n + k] * this.kernel[k];
			power[n] = Math.log(sum + this.floorMw);
		}
		return power;
	}

	/** Adds a part to the cells; a cell with a break in it goes to the nodes directly, each side of the break at its own place. */
	private fillCells(part: SpectrumPart, cells: Float64Array, power: Float64Array, fromHz: number): void {
		const first = Math.max(0, Math.floor((part.startHz - fromHz) / this.stepHz));
		const last = Math.min(cells.length - 1, Math.floor((part.stopHz - fromHz) / this.stepHz));
		const broken = new Map<number, number[]>();
		for (const breakHz of part.breaksHz) {
			const cell = Math.floor((breakHz - fromHz) / this.stepHz);
			if (cell < first || cell > last) continue;
			const known = broken.get(cell);
			if (known) known.push(breakHz);
			else broken.set(cell, [breakHz]);
		}
		for (let i = first; i <= last; i++) {
			const lowHz = fromHz + i * this.stepHz;
			const highHz = fromHz + (i + 1) * this.stepHz;
			const breaks = broken.get(i);
			if (!breaks) {
				cells[i] += part.powerMw(lowHz, highHz);
				continue;
			}
			const edges = [lowHz, ...breaks.sort((a, b) => a - b), highHz];
			for (let e = 1; e < edges.length; e++) this.addPiece(part, edges[e - 1], edges[e], i, power, fromHz);
		}
	}

	private addPiece(
		part: SpectrumPart,
		lowHz: number,
		highHz: number,
		cell: number,
		power: Float64Array,
		fromHz: number
	): void {
		const pieceMw = highHz > lowHz ? part.powerMw(lowHz, highHz) : 0;
		if (pieceMw === 0) return;
		const last = Math.min(power.length - 1, cell);
		for (let n = Math.max(0, cell - 2 * REACH); n <= last; n++) {
			const nodeHz = fromHz + (n + REACH + 0.5) * this.stepHz;
			power[n] += pieceMw * this.meanGain(lowHz - nodeHz, highHz - nodeHz);
		}
	}

	/** Mean of |H|² = exp(−2c·u²) between two offsets. */
	private meanGain(fromHz: number, toHz: number): number {
		const middle = (fromHz + toHz) / 2;
		const half = (toHz - fromHz) / 2;
		let sum = 0;
		for (const [x, weight] of GAUSS) {
			const offset = middle + half * x;
			sum += weight * Math.exp(-this.exponent * offset * offset);
		}
		return sum / 2;
	}
}
