/** Short windows of a long bucket, followed sample by sample: the stretch around an edge, or a whole short burst. */
import type { Scale } from '$lib/schemas/settings';
import { addBurst } from './burst-response';
import type { Frame } from './frame';
import { GaussianProcess } from './gaussian-process';
import type { PassingLine } from './line-response';
import { envelopePeaks } from './peak-finders';
import type { Random } from './random';
import { toScale } from './video';

/** A line that is on from startS to stopS, seen from the window's start. */
export interface WindowBurst {
	line: PassingLine;
	startS: number;
	stopS: number;
}

const PER_RBW = 8;
/** Longest window, samples. */
const LONGEST = 256;

export class WindowSampler {
	readonly stepS: number;
	private readonly process: GaussianProcess;
	private readonly re = new Float64Array(LONGEST + 4);
	private readonly im = new Float64Array(LONGEST + 4);
	private readonly power = new Float64Array(LONGEST + 4);
	private readonly amplitude = new Float64Array(LONGEST + 4);

	constructor(private readonly frame: Frame) {
		this.stepS = 1 / (PER_RBW * frame.rbwHz);
		this.process = new GaussianProcess(frame.rbwHz, this.stepS, LONGEST + 4);
	}

	/** Longest stretch one window can follow, s. */
	get longestS(): number {
		return LONGEST * this.stepS;
	}

	/**
	 * @param lengthS how long the window is, s
	 * @param v noise power in it, mW
	 */
	sample(
		lengthS: number,
		v: number,
		bursts: WindowBurst[],
		scale: Scale,
		random: Random
	): { greatest: number; least: number; mean: number } {
		const { re, im, power } = this;
		const m = Math.max(2, Math.min(LONGEST, Math.round(lengthS / this.stepS)));
		const local: Frame = { ...this.frame, stepS: this.stepS, lead: 1, trail: 2, perBucket: m, points: 1, total: m + 4 };
		re.fill(0, 0, m + 4);
		im.fill(0, 0, m + 4);
		for (const { line, startS, stopS } of bursts) addBurst(local, line, startS, stopS, 0, m + 4, re, im);
		this.amplitude.fill(Math.sqrt(v / 2));
		this.process.addTo(random, this.amplitude, re, im);
		for (let i = 0; i < m + 4; i++) power[i] = re[i] * re[i] + im[i] * im[i];
		const find = envelopePeaks(re, im, power, (p) => p);
		const greatest = find.greatest(1, m);
		const least = find.least(1, m);
		toScale(power, scale, 1, m + 2);
		let mean = (power[1] + power[m + 1]) / 2;
		for (let i = 2; i <= m; i++) mean += power[i];
		return { greatest, least, mean: mean / m };
	}
}
