/** Peaks between samples: of filtered video (a parabola), and of the unfiltered envelope (from the complex samples). */
import type { PeakFinder } from './detect';

/** Filtered video is smooth against its samples: the parabola through the extreme sample and its neighbours. */
export function videoPeaks(video: Float64Array): PeakFinder {
	const extreme = (start: number, m: number, sign: 1 | -1): number => {
		let at = start;
		for (let i = start + 1; i <= start + m; i++) if (sign * (video[i] - video[at]) > 0) at = i;
		return vertex(video[at - 1], video[at], video[at + 1], at === start, at === start + m);
	};
	return {
		greatest: (start, m) => extreme(start, m, 1),
		least: (start, m) => extreme(start, m, -1)
	};
}

/** Vertex of the parabola through three equally spaced values, kept inside the bucket when the middle one is its end. */
function vertex(before: number, at: number, after: number, isFirst: boolean, isLast: boolean): number {
	const slope = (after - before) / 2;
	const bend = after - 2 * at + before;
	if (bend === 0) return at;
	const x = -slope / bend;
	if (Math.abs(x) > 1 || (isFirst && x < 0) || (isLast && x > 0)) return at;
	return at + (slope * x) / 2;
}

/**
 * Peaks of |z|² from complex samples at 8 per 1/B: the greatest over the cubic through four samples at quarter steps either side
 * of the highest sample, then a parabola; the least over the chords between samples, since a null is a near miss of the origin.
 */
export function envelopePeaks(
	re: Float64Array,
	im: Float64Array,
	power: Float64Array,
	toScaleValue: (power: number) => number
): PeakFinder {
	return {
		greatest(start, m) {
			let at = start;
			for (let i = start + 1; i <= start + m; i++) if (power[i] > power[at]) at = i;
			return toScaleValue(cubicPeak(re, im, power, at, at === start, at === start + m));
		},
		least(start, m) {
			let least = Infinity;
			for (let i = start; i < start + m; i++) {
				const near = chordMinimum(re[i], im[i], re[i + 1], im[i + 1]);
				if (near < least) least = near;
			}
			return toScaleValue(least);
		}
	};
}

/** Least |z|² on the straight line from one complex sample to the next. */
function chordMinimum(x0: number, y0: number, x1: number, y1: number): number {
	const dx = x1 - x0;
	const dy = y1 - y0;
	const length = dx * dx + dy * dy;
	const along = -(x0 * dx + y0 * dy);
	if (along <= 0 || length === 0) return x0 * x0 + y0 * y0;
	if (along >= length) return x1 * x1 + y1 * y1;
	const cross = x0 * dy - y0 * dx;
	return (cross * cross) / length;
}

// Lagrange weights of the cubic through samples −1, 0, 1, 2 at ¼, ½ and ¾ of the way from 0 to 1.
const WEIGHTS = [0.25, 0.5, 0.75].map((x) => [
	(-x * (x - 1) * (x - 2)) / 6,
	((x + 1) * (x - 1) * (x - 2)) / 2,
	(-(x + 1) * x * (x - 2)) / 2,
	((x + 1) * x * (x - 1)) / 6
]);

function cubicPeak(
	re: Float64Array,
	im: Float64Array,
	power: Float64Array,
	at: number,
	isFirst: boolean,
	isLast: boolean
): number {
	// quarter steps −¾ … ¾ about the highest sample; index 3 is the sample itself
	const values = [-1, -1, -1, power[at], -1, -1, -1];
	for (let q = 0; q < 3; q++) {
		if (!isFirst) values[q] = cubicPower(re, im, at - 1, WEIGHTS[q]);
		if (!isLast) values[4 + q] = cubicPower(re, im, at, WEIGHTS[q]);
	}
	let best = 3;
	for (let q = 0; q < 7; q++) if (values[q] > values[best]) best = q;
	if (best === 0 || best === 6 || values[best - 1] < 0 || values[best + 1] < 0) return values[best];
	const slope = (values[best + 1] - values[best - 1]) / 2;
	const bend = values[best + 1] - 2 * values[best] + values[best - 1];
	return bend < 0 ? values[best] - (slope * slope) / (2 * bend) : values[best];
}

function cubicPower(re: Float64Array, im: Float64Array, i: number, w: number[]): number {
	const x = w[0] * re[i - 1] + w[1] * re[i] + w[2] * re[i + 1] + w[3] * re[i + 2];
	const y = w[0] * im[i - 1] + w[1] * im[i] + w[2] * im[i + 1] + w[3] * im[i + 2];
	return x * x + y * y;
}
