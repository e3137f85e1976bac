/** What a video filter between B/20 and 10 B leaves of the extremes of unfiltered noise. */
import type { Scale } from '$lib/schemas/settings';
import { meanOnScale } from './average-laws';
import type { Frame } from './frame';
import type { Piece } from './long-bucket';
import { SMOOTHING_TABLE } from './smoothing-table';

/**
 * The filtered extreme stands closer to the mean: by a share that was measured, by this bench's own sampled sweep, for each scale
 * and ratio VBW/B (src/cli/smoothing-table.ts makes the table). Shares are of the distance from the mean on the scale.
 */
export class Smoothing {
	private readonly greatest: number;
	private readonly least: number;

	constructor(
		frame: Frame,
		private readonly scale: Scale
	) {
		const table = SMOOTHING_TABLE[scale];
		const at = Math.log10(frame.vbwHz / frame.rbwHz);
		this.greatest = between(table.greatest, at);
		this.least = between(table.least, at);
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

/** Straight between the table's ratios, flat outside. */
function between(points: readonly (readonly [number, number])[], at: number): number {
	if (at <= points[0][0]) return points[0][1];
	for (let i = 1; i < points.length; i++) {
		const [x1, y1] = points[i];
		const [x0, y0] = points[i - 1];
		if (at <= x1) return y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
	}
	return points[points.length - 1][1];
}
