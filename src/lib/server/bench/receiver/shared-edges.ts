/** Half of 1/B either side of each edge between long buckets is followed sample by sample, so that neighbours stay correlated. */
import type { Scale } from '$lib/schemas/settings';
import type { Frame } from './frame';
import { GaussianProcess } from './gaussian-process';
import type { Window } from './long-bucket';
import type { PeakFinder } from './detect';
import { envelopePeaks } from './peak-finders';
import type { Random } from './random';
import { powerOnScale } from './video';

/** Samples of one edge (8 per 1/B, ends included), and lattice steps from one edge to the next: far enough to be independent. */
const EDGE = 9;
const APART = 18;
const MIDDLE = 4;

/** Conditions at an edge: noise power, and the line's amplitude. */
export interface EdgeConditions {
	v: number;
	re: number;
	im: number;
}

export class SharedEdges {
	private readonly process: GaussianProcess;
	private readonly total: number;
	private readonly re: Float64Array;
	private readonly im: Float64Array;
	private readonly video: Float64Array;
	private readonly amplitude: Float64Array;
	private readonly find: PeakFinder;

	constructor(frame: Frame, scale: Scale) {
		this.total = (frame.points + 1) * APART + 4;
		this.process = new GaussianProcess(frame.rbwHz, 1 / (8 * frame.rbwHz), this.total);
		this.re = new Float64Array(this.total);
		this.im = new Float64Array(this.total);
		this.video = new Float64Array(this.total);
		this.amplitude = new Float64Array(this.total);
		this.find = envelopePeaks(this.re, this.im, this.video, (power) => powerOnScale(power, scale));
	}

	draw(random: Random, at: (edge: number) => EdgeConditions): void {
		const { re, im, video, amplitude } = this;
		for (let e = 0, i = 2; i + APART <= this.total; e++, i += APART) {
			const { v, re: x, im: y } = at(e);
			amplitude.fill(Math.sqrt(v / 2), i - 2, i + APART - 2);
			re.fill(x, i - 2, i + APART - 2);
			im.fill(y, i - 2, i + APART - 2);
		}
		this.process.addTo(random, amplitude, re, im);
		for (let i = 0; i < this.total; i++) video[i] = re[i] * re[i] + im[i] * im[i];
	}

	/** Extremes, on the scale, of the two half edges of bucket b: its start's later half and its end's earlier half. */
	window(b: number): Window {
		const { find } = this;
		const start = 2 + b * APART + MIDDLE;
		const end = 2 + (b + 1) * APART;
		return {
			share: 0,
			mean: 0,
			greatest: Math.max(find.greatest(start, EDGE - 1 - MIDDLE), find.greatest(end, MIDDLE)),
			least: Math.min(find.least(start, EDGE - 1 - MIDDLE), find.least(end, MIDDLE))
		};
	}
}
