/** One long bucket as pieces of steady conditions and short windows followed sample by sample, and what a detector makes of them. */
import type { Detector, Scale } from '$lib/schemas/settings';
import { drawAverage, meanOnScale, varianceOnScale } from './average-laws';
import { leastOfNoise, logAbove, logBelow, solveLog, type GreatestOfNoise } from './extreme-laws';
import type { Random } from './random';
import type { Smoothing } from './smoothing';
import { powerOnScale } from './video';

/** A stretch of a bucket during which noise (v, mW) and line power (p, mW) stand still; share of the bucket's time. */
export interface Piece {
	share: number;
	v: number;
	p: number;
}

/** What a window followed sample by sample gave: extremes and mean of its video on the scale. */
export interface Window {
	share: number;
	greatest: number;
	least: number;
	mean: number;
}

/** Average on the scale: the law's draw over the pieces, the windows as they were. */
export function averageOf(
	pieces: Piece[],
	windows: Window[],
	bt: number,
	scale: Scale,
	random: Random
): number {
	let mean = 0;
	let variance = 0;
	let share = 0;
	for (const piece of pieces) {
		const w = piece.share;
		if (w <= 0) continue;
		mean += w * meanOnScale(piece.v, piece.p, scale);
		variance += w * w * varianceOnScale(piece.v, piece.p, scale, Math.max(0.25, bt * w));
		share += w;
	}
	let total = 0;
	for (const window of windows) total += window.share * window.mean;
	if (share <= 0) return total;
	return total + share * drawAverage(random, mean / share, variance / (share * share), scale, bt * share);
}

/** Greatest (or least) power over the pieces, by their joint law; −1 where there are none. */
export function extremeOf(
	pieces: Piece[],
	bt: number,
	greatest: boolean,
	table: GreatestOfNoise,
	random: Random
): number {
	if (pieces.length === 0) return -1;
	const draw = random.exponential();
	const first = pieces[0];
	if (pieces.length === 1 && first.p === 0) {
		if (!greatest) return first.v * leastOfNoise(draw, bt * first.share);
		return first.v * table.draw(draw, bt * first.share);
	}
	const active = strongest(pieces, greatest);
	if (greatest)
		return Math.exp(
			solveLog(
				(x) => sum(active, (q) => logBelow(x / q.v, q.p / q.v, bt * q.share)),
				-draw,
				Math.log(active[0].v + active[0].p)
			)
		);
	// −ln P(least > x) rises with x; its inverse is what the solver expects to fall
	return Math.exp(
		solveLog(
			(x) => 1 / sum(active, (q) => logAbove(x / q.v, q.p / q.v, bt * q.share)),
			-1 / draw,
			Math.log(active[0].v * 1e-3)
		)
	);
}

/** Pieces whose joint law is solved. */
const MOST_PIECES = 4;

const sum = (pieces: Piece[], f: (piece: Piece) => number): number => {
	let total = 0;
	for (const piece of pieces) total += f(piece);
	return total;
};

/** Only pieces that could hold the extreme: within 20 dB of the strongest for peaks (all for minima), most likely first. */
function strongest(pieces: Piece[], greatest: boolean): Piece[] {
	const level = (q: Piece): number => (greatest ? q.v * 8 + q.p : -(q.v + q.p));
	const sorted = [...pieces].sort((a, b) => level(b) - level(a));
	const kept = greatest
		? sorted.filter((q) => q.v * 8 + q.p > 0.01 * (sorted[0].v * 8 + sorted[0].p))
		: sorted;
	if (kept.length <= MOST_PIECES) return kept;
	// the dropped ones' time is given to the kept ones in proportion
	const top = kept.slice(0, MOST_PIECES);
	const scale = sum(kept, (q) => q.share) / sum(top, (q) => q.share);
	return top.map((q) => ({ ...q, share: q.share * scale }));
}

/** A peak detector's value on the scale for bucket number b. Continuous noise turns within a long bucket, so rise-fall alternates. */
export function peakOf(
	b: number,
	detector: Detector,
	scale: Scale,
	pieces: Piece[],
	windows: Window[],
	bt: number,
	table: GreatestOfNoise,
	smoothing: Smoothing | undefined,
	random: Random
): number {
	const greatest = detector === 'positive-peak' || (detector === 'rise-fall' && b % 2 === 0);
	let value = extremeOnScale(pieces, bt, greatest, table, smoothing, scale, random);
	for (const window of windows) {
		const edge = greatest ? window.greatest : window.least;
		if (greatest ? edge > value : edge < value) value = edge;
	}
	return value;
}

/** The pieces' extreme on the scale, smoothed as the video filter would; ±Infinity where there are no pieces. */
function extremeOnScale(
	pieces: Piece[],
	bt: number,
	greatest: boolean,
	table: GreatestOfNoise,
	smoothing: Smoothing | undefined,
	scale: Scale,
	random: Random
): number {
	const power = extremeOf(pieces, bt, greatest, table, random);
	if (power < 0) return greatest ? -Infinity : Infinity;
	const value = powerOnScale(power, scale);
	return smoothing ? smoothing.extreme(value, pieces, greatest) : value;
}
