/** Runs a video filter in before a sweep starts, on a lattice of its own: no finer than the resolution filter needs. */
import type { Scale } from '$lib/schemas/settings';
import type { Contribution, RowContext } from './contribution';
import type { Frame } from './frame';
import { onePole, toScale, videoRunInS } from './video';

/** Longest run-in, in 1/B; a slower filter starts from the mean over it, within 0.25 dB of where it would rest. */
const LONGEST = 400;
const PER_RBW = 8;

/** The frame of the stretch just before a sweep. */
export function runInFrame(frame: Frame): Frame {
	const stepS = 1 / (PER_RBW * frame.rbwHz);
	const total = Math.ceil(Math.min(videoRunInS(frame.vbwHz), LONGEST / frame.rbwHz) / stepS) + 2;
	const lengthS = (total - 1) * stepS;
	return {
		...frame,
		stepS,
		lead: 0,
		trail: 0,
		total,
		points: 1,
		bucketS: lengthS,
		startHz: frame.startHz - frame.sweepHzPerS * lengthS
	};
}

export class RunIn {
	private readonly re: Float64Array;
	private readonly im: Float64Array;
	private readonly video: Float64Array;

	constructor(
		private readonly frame: Frame,
		private readonly scale: Scale,
		private readonly contributions: Contribution[]
	) {
		this.re = new Float64Array(frame.total);
		this.im = new Float64Array(frame.total);
		this.video = new Float64Array(frame.total);
	}

	/** The filter's state when the row's first sample comes. */
	state(row: RowContext): number {
		const { frame, re, im, video } = this;
		re.fill(0);
		im.fill(0);
		const before: RowContext = {
			clockS: row.clockS - (frame.total - 1) * frame.stepS,
			random: (stream) => row.random(`run-in/${stream}`)
		};
		for (const contribution of this.contributions) contribution.addTo(before, frame, re, im);
		for (let i = 0; i < frame.total; i++) video[i] = re[i] * re[i] + im[i] * im[i];
		toScale(video, this.scale, 0, frame.total);
		const isWhole = frame.total * frame.stepS >= videoRunInS(frame.vbwHz);
		const start = isWhole ? video[0] : video.reduce((a, b) => a + b, 0) / frame.total;
		onePole(video, frame.vbwHz, frame.stepS, frame.total, start);
		return video[frame.total - 1];
	}
}
