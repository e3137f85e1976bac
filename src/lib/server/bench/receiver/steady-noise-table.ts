/** Noise that is always there, against time in the sweep: per long bucket one piece where it stands still, several where it changes. */
import type { Frame } from './frame';
import type { IncidentNoise } from './incident';
import type { Piece } from './long-bucket';

const MOST_NODES = 16;

export class SteadyNoiseTable {
	/** Smallest variance of the sweep, mW: what a line must stand out from. */
	readonly least: number;
	private readonly nodes: number;
	private readonly values: Float64Array;

	constructor(
		private readonly frame: Frame,
		private readonly noises: IncidentNoise[]
	) {
		const across = (4 * frame.sweepHzPerS * frame.bucketS) / frame.rbwHz;
		this.nodes = Math.min(MOST_NODES, Math.max(1, Math.ceil(across)));
		this.values = new Float64Array(frame.points * this.nodes);
		for (let i = 0; i < this.values.length; i++)
			this.values[i] = this.at(((i + 0.5) / this.nodes) * frame.bucketS);
		this.least = this.values.reduce((a, b) => Math.min(a, b), Infinity);
	}

	/** Variance t seconds into the sweep, mW. */
	at(t: number): number {
		const tuned = this.frame.startHz + this.frame.sweepHzPerS * t;
		let sum = 0;
		for (const noise of this.noises) sum += noise.variance(tuned);
		return sum;
	}

	/** Fresh pieces of bucket b; one if its variance moves by less than 1 %. */
	pieces(b: number): Piece[] {
		const { nodes, values } = this;
		const first = b * nodes;
		let low = values[first];
		let high = low;
		let sum = 0;
		for (let i = first; i < first + nodes; i++) {
			low = Math.min(low, values[i]);
			high = Math.max(high, values[i]);
			sum += values[i];
		}
		if (high <= 1.01 * low) return [{ share: 1, v: sum / nodes, p: 0 }];
		return Array.from({ length: nodes }, (_, j) => ({ share: 1 / nodes, v: values[first + j], p: 0 }));
	}
}
