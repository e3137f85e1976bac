/** Detectors: what one bucket of video becomes. All give one value per point on the trace's scale (ln p, p or √p). */
import type { Detector } from '$lib/schemas/settings';
import type { Frame } from './frame';

/** The value at the point itself: the bucket's middle sample. */
export function detectSample(frame: Frame, video: Float64Array, out: Float64Array): void {
	const { points, perBucket, lead } = frame;
	for (let b = 0, i = lead + perBucket / 2; b < points; b++, i += perBucket) out[b] = video[i];
}

/** Mean over the bucket by Simpson's rule. */
export function detectAverage(frame: Frame, video: Float64Array, out: Float64Array): void {
	const { points, perBucket: m, lead } = frame;
	for (let b = 0, start = lead; b < points; b++, start += m) {
		let odd = 0;
		let even = 0;
		for (let i = start + 1; i < start + m; i += 2) odd += video[i];
		for (let i = start + 2; i < start + m; i += 2) even += video[i];
		out[b] = (video[start] + 4 * odd + 2 * even + video[start + m]) / (3 * m);
	}
}

/** How peaks of the continuous video are found between samples. */
export interface PeakFinder {
	/** Greatest and least of the continuous video in samples start…start+m, on the scale of `video`. */
	greatest(start: number, m: number): number;
	least(start: number, m: number): number;
}

/** Positive, negative or alternating peaks of the continuous video. */
export function detectPeaks(
	frame: Frame,
	detector: Exclude<Detector, 'sample' | 'average'>,
	video: Float64Array,
	find: PeakFinder,
	out: Float64Array
): void {
	const { points, perBucket: m, lead } = frame;
	for (let b = 0, start = lead; b < points; b++, start += m) {
		const greatest =
			detector === 'positive-peak' ||
			(detector === 'rise-fall' && (b % 2 === 0 || isMonotonic(video, start, m)));
		out[b] = greatest ? find.greatest(start, m) : find.least(start, m);
	}
}

/**
 * Whether the continuous video only rises or only falls over a bucket: its samples do, and its slope at both ends
 * (central difference) agrees, so that no turning point hides between the end samples and their neighbours.
 */
export function isMonotonic(video: Float64Array, start: number, m: number): boolean {
	const sign = video[start + m] > video[start] ? 1 : -1;
	if (sign * (video[start + 1] - video[start - 1]) <= 0) return false;
	if (sign * (video[start + m + 1] - video[start + m - 1]) <= 0) return false;
	for (let i = start; i < start + m; i++) if (sign * (video[i + 1] - video[i]) < 0) return false;
	return true;
}
