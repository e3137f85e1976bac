/**
 * A sweep with a video filter far narrower than the resolution (VBW ≤ B/20) and long buckets: the video is averaged by the law
 * over chunks short against the video filter and long against 1/B, then the pole runs over the chunks.
 */
import type { Detector, Scale } from '$lib/schemas/settings';
import type { RowContext } from './contribution';
import type { Frame } from './frame';
import type { Incident } from './incident';
import { averageOf } from './long-bucket';
import { LongBucketConditions } from './long-conditions';
import type { Seed } from './random';
import { videoRunInS } from './video';

/** Chunk length in 1/VBW: shorter for peaks, which are sought between chunks. */
const CHUNK = 0.1;
const PEAK_CHUNK = 0.04;

/** Chunks to a bucket: odd, so that one stands at the point itself. */
export function chunksPerBucket(frame: Frame, detector: Detector): number {
	const wanted = detector === 'average' || detector === 'sample' ? CHUNK : PEAK_CHUNK;
	const count = Math.max(1, Math.ceil((frame.bucketS * frame.vbwHz) / wanted));
	const most = Math.max(1, Math.floor((frame.bucketS * frame.rbwHz) / 2));
	const chosen = Math.min(count, most);
	return chosen % 2 === 1 ? chosen : Math.max(1, chosen - 1);
}

export class ChunkSweep {
	private readonly perBucket: number;
	private readonly chunkS: number;
	private readonly lead: number;
	/** Share of the old state that a chunk keeps. */
	private readonly keep: number;
	/** Length in 1/B that a chunk's average is drawn for. */
	private readonly bt: number;
	private readonly conditions: LongBucketConditions;
	private readonly video: Float64Array;

	constructor(
		private readonly frame: Frame,
		private readonly detector: Detector,
		private readonly scale: Scale,
		incident: Incident,
		seed: Seed
	) {
		this.perBucket = chunksPerBucket(frame, detector);
		this.chunkS = frame.bucketS / this.perBucket;
		this.lead = Math.ceil(videoRunInS(frame.vbwHz) / this.chunkS);
		this.keep = Math.exp(-2 * Math.PI * frame.vbwHz * this.chunkS);
		// a held input of variance v leaves v·(1−α)/(1+α) behind the pole; the true video leaves S₀·π·VBW, S₀ = v·(chunk)
		const held = (Math.PI * frame.vbwHz * this.chunkS * (1 + this.keep)) / (1 - this.keep);
		this.bt = (frame.rbwHz * this.chunkS) / held;
		const chunks = this.lead + frame.points * this.perBucket;
		const chunkFrame: Frame = {
			...frame,
			points: chunks,
			bucketS: this.chunkS,
			startHz: frame.startHz - frame.sweepHzPerS * this.lead * this.chunkS
		};
		this.conditions = new LongBucketConditions(
			{ ...chunkFrame, vbwHz: Infinity },
			incident,
			scale,
			seed,
			false
		);
		this.video = new Float64Array(chunks);
	}

	row(context: RowContext, out: Float64Array): void {
		const { frame, video, perBucket, lead, scale } = this;
		const random = context.random('law');
		this.conditions.start({ ...context, clockS: context.clockS - lead * this.chunkS });
		const chunks = video.length;
		let state = 0;
		for (let i = 0; i < chunks; i++) {
			const { pieces, windows } = this.conditions.bucket(i, random);
			const input = averageOf(pieces, windows, this.bt, scale, random);
			state = i === 0 ? input : this.keep * state + (1 - this.keep) * input;
			video[i] = state;
		}
		for (let b = 0, start = lead; b < frame.points; b++, start += perBucket) out[b] = this.detect(b, start);
	}

	private detect(b: number, start: number): number {
		const { video, perBucket: m, detector } = this;
		if (detector === 'sample') return video[start + (m - 1) / 2];
		if (detector === 'average') {
			let sum = 0;
			for (let i = start; i < start + m; i++) sum += video[i];
			return sum / m;
		}
		let low = Math.min(video[start], video[start - 1]);
		let high = Math.max(video[start], video[start - 1]);
		let rises = true;
		let falls = true;
		for (let i = start; i < start + m; i++) {
			low = Math.min(low, video[i]);
			high = Math.max(high, video[i]);
			if (video[i] < video[i - 1]) rises = false;
			if (video[i] > video[i - 1]) falls = false;
		}
		if (detector === 'positive-peak') return high;
		if (detector === 'negative-peak') return low;
		return rises || falls || b % 2 === 0 ? high : low;
	}
}
