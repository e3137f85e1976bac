/** Noise that is always there, against time in the sweep: tabulated once, since it is asked for at every piece of every bucket. */
import type { Frame } from './frame';
import type { IncidentNoise } from './incident';
import type { Piece } from './long-bucket';

/** Table steps to one B of tuned frequency: the filter has smoothed everything finer. */
const STEPS_PER_RBW = 16;
const MOST_NODES = 16;

export class SteadyNoiseTable {
	/** Smallest variance of the sweep, mW: what a line must stand out from. */
	readonly least: number;
	private readonly nodes: number;
	private readonly stepS: number;
	/** ln of the variance at steps of stepS from the sweep's start. */
	private readonly logs: Float64Array;
	/** Pieces of each bucket asked for before: the same in every row. */
	private readonly made: Piece[][] = [];

	constructor(
		private readonly frame: Frame,
		noises: IncidentNoise[]
	) {
		const lengthS = frame.points * frame.bucketS;
		const widths = (frame.sweepHzPerS * lengthS) / frame.rbwHz;
		this.nodes = Math.min(MOST_NODES, Math.max(1, Math.ceil((4 * widths) / frame.points)));
		const steps = Math.max(1, Math.min(frame.points * this.nodes, Math.ceil(STEPS_PER_RBW * widths)));
		this.stepS = lengthS / steps;
		this.logs = new Float64Array(steps + 2);
		for (let i = 0; i < this.logs.length; i++) {
			const tuned = frame.startHz + frame.sweepHzPerS * i * this.stepS;
			let sum = 0;
			for (const noise of noises) sum += noise.variance(tuned);
			this.logs[i] = Math.log(sum);
		}
		this.least = Math.exp(this.logs.reduce((a, b) => Math.min(a, b), Infinity));
	}

	/** Variance t seconds into the sweep, mW; straight in its logarithm between steps. */
	at(t: number): number {
		const place = Math.min(this.logs.length - 1.001, Math.max(0, t / this.stepS));
		const i = Math.floor(place);
		return Math.exp(this.logs[i] + (place - i) * (this.logs[i + 1] - this.logs[i]));
	}

	/** Pieces of bucket b, the caller's to change; one if its variance moves by less than 1 %. */
	pieces(b: number): Piece[] {
		const made = (this.made[b] ??= this.makePieces(b));
		return made.map(({ share, v, p }) => ({ share, v, p }));
	}

	private makePieces(b: number): Piece[] {
		const { nodes } = this;
		const { bucketS } = this.frame;
		const middle = this.at((b + 0.5) * bucketS);
		if (nodes === 1) return [{ share: 1, v: middle, p: 0 }];
		const list = Array.from({ length: nodes }, (_, j) => ({
			share: 1 / nodes,
			v: this.at((b + (j + 0.5) / nodes) * bucketS),
			p: 0
		}));
		const isLevel = list.every(({ v }) => Math.abs(v - middle) <= 0.01 * middle);
		return isLevel ? [{ share: 1, v: middle, p: 0 }] : list;
	}
}
