/** Short windows of a long bucket, followed sample by sample: the stretch around an edge, or a whole short burst. */
import type { Scale } from '$lib/schemas/settings';
import { addBurst } from './burst-response';
import type { Frame } from './frame';
import { GaussianProcess } from './gaussian-process';
import type { PeakFinder } from './detect';
import type { PassingLine } from './line-response';
import { envelopePeaks, videoPeaks } from './peak-finders';
import type { Random } from './random';
import { filtersVideo, onePole, powerOnScale, toScale } from './video';

/** A line that is on from startS to stopS, seen from the window's start. */
export interface WindowBurst {
	line: PassingLine;
	startS: number;
	stopS: number;
}

/** Values on the scale. */
export interface SampledWindow {
	greatest: number;
	least: number;
	mean: number;
}

const PER_RBW = 8;
/** Longest window, samples; most are short, and need only a short run of noise. */
const LONGEST = 256;
const SHORT = 48;

export class WindowSampler {
	readonly stepS: number;
	private readonly long: GaussianProcess;
	private readonly short: GaussianProcess;
	private readonly re = new Float64Array(LONGEST + 4);
	private readonly im = new Float64Array(LONGEST + 4);
	private readonly video = new Float64Array(LONGEST + 4);
	private readonly amplitude = new Float64Array(LONGEST + 4);
	private readonly local: Frame;
	private readonly filtered: boolean;
	private readonly find: PeakFinder;

	constructor(
		frame: Frame,
		private readonly scale: Scale
	) {
		this.stepS = 1 / (PER_RBW * frame.rbwHz);
		this.long = new GaussianProcess(frame.rbwHz, this.stepS, LONGEST + 4);
		this.short = new GaussianProcess(frame.rbwHz, this.stepS, SHORT + 4);
		this.local = { ...frame, stepS: this.stepS, lead: 1, trail: 2, points: 1 };
		this.filtered = filtersVideo(frame);
		this.find = this.filtered
			? videoPeaks(this.video)
			: envelopePeaks(this.re, this.im, this.video, (power) => powerOnScale(power, scale));
	}

	/** Longest stretch one window can follow, s. */
	get longestS(): number {
		return LONGEST * this.stepS;
	}

	/**
	 * Extremes and mean of the video on the scale over a window.
	 * @param lengthS how long the window is, s
	 * @param v noise power in it, mW
	 */
	sample(lengthS: number, v: number, bursts: WindowBurst[], random: Random): SampledWindow {
		const m = this.fill(lengthS, v, bursts, random);
		const { video, find } = this;
		if (this.filtered) this.filter(m);
		const greatest = find.greatest(1, m);
		const least = find.least(1, m);
		if (!this.filtered) toScale(video, this.scale, 1, m + 2);
		let mean = (video[1] + video[m + 1]) / 2;
		for (let i = 2; i <= m; i++) mean += video[i];
		return { greatest, least, mean: mean / m };
	}

	/** The video at the window's end, its filter run in from the window's start. */
	last(lengthS: number, v: number, bursts: WindowBurst[], random: Random): number {
		const m = this.fill(lengthS, v, bursts, random);
		this.filter(m);
		return this.video[m + 1];
	}

	private fill(lengthS: number, v: number, bursts: WindowBurst[], random: Random): number {
		const { re, im, video, local } = this;
		const m = Math.max(2, Math.min(LONGEST, Math.round(lengthS / this.stepS)));
		local.perBucket = m;
		local.total = m + 4;
		re.fill(0, 0, m + 4);
		im.fill(0, 0, m + 4);
		for (const { line, startS, stopS } of bursts) addBurst(local, line, startS, stopS, 0, m + 4, re, im);
		const process = m <= SHORT ? this.short : this.long;
		this.amplitude.fill(Math.sqrt(v / 2), 0, process.total);
		process.addTo(random, this.amplitude, re, im);
		for (let i = 0; i < m + 4; i++) video[i] = re[i] * re[i] + im[i] * im[i];
		return m;
	}

	private filter(m: number): void {
		const { video, local } = this;
		toScale(video, this.scale, 0, m + 4);
		if (this.filtered) onePole(video, local.vbwHz, this.stepS, m + 4, video[0]);
	}
}
