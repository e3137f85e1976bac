/** What a video filter between B/20 and 10 B leaves of the extremes of unfiltered noise. */
import type { Scale } from '$lib/schemas/settings';
import { meanOnScale } from './average-laws';
import type { Frame } from './frame';
import type { Piece } from './long-bucket';
import { SMOOTHING_LENGTHS, SMOOTHING_TABLE, type SmoothingRow } from './smoothing-table';

/**
 * The filtered extreme stands closer to the mean: by a share that was measured, by this bench's own sampled sweep, for each scale,
 * ratio VBW/B and length of bucket (src/cli/smoothing-table.ts makes the table). Shares are of the distance from the mean on the scale.
 */
export class Smoothing {
	private readonly greatest: number;
	private readonly least: number;

	constructor(
		frame: Frame,
		private readonly scale: Scale
	) {
		const table = SMOOTHING_TABLE[scale];
		const ratio = Math.log10(frame.vbwHz / frame.rbwHz);
		const bt = frame.rbwHz * frame.bucketS;
		this.greatest = shareOf(table.greatest, ratio, bt);
		this.least = shareOf(table.least, ratio, bt);
	}

	/** @param value the unfiltered extreme on the scale */
	extreme(value: number, pieces: Piece[], greatest: boolean): number {
		let mean = 0;
		let share = 0;
		for (const piece of pieces) {
			mean += piece.share * meanOnScale(piece.v, piece.p, this.scale);
			share += piece.share;
		}
		mean /= share;
		return mean + (value - mean) * (greatest ? this.greatest : this.least);
	}
}

/** Straight between the table's ratios, and over the logarithm of the length; flat outside. */
function shareOf(rows: readonly SmoothingRow[], ratio: number, bt: number): number {
	const lengths = SMOOTHING_LENGTHS.map((length, i) => [
		Math.log(length),
		between(
			rows.map((row) => [row[0], row[i + 1]]),
			ratio
		)
	]);
	return between(lengths, Math.log(bt));
}

/** Straight between points [x, y], flat outside. */
function between(points: number[][], at: number): number {
	if (at <= points[0][0]) return points[0][1];
	for (let i = 1; i < points.length; i++) {
		const [x1, y1] = points[i];
		const [x0, y0] = points[i - 1];
		if (at <= x1) return y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
	}
	return points[points.length - 1][1];
}
