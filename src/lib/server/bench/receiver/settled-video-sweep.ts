/**
 * A sweep whose video filter is narrow against the resolution (VBW ≤ B/20) yet settles many times within a bucket:
 * what it shows is the law of a smoothed video, nearly normal about the mean, with extremes of as many independent values as fit.
 */
import type { Detector, Scale } from '$lib/schemas/settings';
import { meanOnScale, varianceOnScale } from './average-laws';
import type { RowContext } from './contribution';
import type { Frame } from './frame';
import type { Incident } from './incident';
import type { Piece } from './long-bucket';
import { LongBucketConditions } from './long-conditions';
import { normalQuantile } from './normal-quantile';
import type { Random, Seed } from './random';

/** Buckets at least this long (in 1/VBW) are settled. */
export const SETTLED = 1.5;
/** Independent values of one-pole noise in 1/VBW, as a peak detector meets them (this bench's chunked sweep, measured at 3/VBW). */
const INDEPENDENT_PER_VBW = 11;

export class SettledVideoSweep {
	private readonly conditions: LongBucketConditions;
	/** Length in 1/B whose average has the filtered video's variance: B/(π·VBW). */
	private readonly bt: number;

	constructor(
		private readonly frame: Frame,
		private readonly detector: Detector,
		private readonly scale: Scale,
		incident: Incident,
		seed: Seed
	) {
		this.bt = frame.rbwHz / (Math.PI * frame.vbwHz);
		this.conditions = new LongBucketConditions({ ...frame, vbwHz: Infinity }, incident, scale, seed, false);
	}

	row(context: RowContext, out: Float64Array): void {
		const random = context.random('law');
		this.conditions.start(context);
		for (let b = 0; b < this.frame.points; b++) {
			const { pieces, windows } = this.conditions.bucket(b, random);
			const burst = windows.reduce((sum, w) => sum + w.share * w.mean, 0);
			const share = pieces.reduce((sum, q) => sum + q.share, 0);
			const level = pieces.reduce((sum, q) => sum + q.share * meanOnScale(q.v, q.p, this.scale), 0) / share;
			// bursts shorter than the filter settles raise the mean and nothing else
			const mean = share * level + burst;
			out[b] = this.detect(b, pieces, mean, random);
		}
	}

	private detect(b: number, pieces: Piece[], mean: number, random: Random): number {
		const { detector, frame } = this;
		if (detector === 'sample') return this.value(chosen(pieces, random), mean, random.normal());
		const greatest = detector === 'positive-peak' || (detector === 'rise-fall' && b % 2 === 0);
		const sign = greatest ? 1 : -1;
		let extreme = -Infinity;
		for (const piece of pieces) {
			const count = Math.max(1, piece.share * frame.bucketS * frame.vbwHz * INDEPENDENT_PER_VBW);
			const z = normalQuantile(random.open() ** (1 / count));
			extreme = Math.max(extreme, sign * this.value(piece, mean, sign * z));
		}
		return sign * extreme;
	}

	/** The filtered video z deviations from where the filter settles during a piece; a short piece is not reached whole. */
	private value(piece: Piece, mean: number, z: number): number {
		const { frame, scale } = this;
		const own = meanOnScale(piece.v, piece.p, scale);
		const reached = -Math.expm1(-2 * Math.PI * frame.vbwHz * piece.share * frame.bucketS);
		const deviation = Math.sqrt(varianceOnScale(piece.v, piece.p, scale, this.bt));
		return mean + (own - mean) * reached + z * deviation;
	}
}

/** A piece by its share of the time. */
function chosen(pieces: Piece[], random: Random): Piece {
	let left = random.uniform() * pieces.reduce((sum, q) => sum + q.share, 0);
	return pieces.find((q) => (left -= q.share) <= 0) ?? pieces[pieces.length - 1];
}
