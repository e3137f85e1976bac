/** Peaks of a trace: points that stand out from both sides. */
import type { Side } from './reading-request';

export interface PeakRule {
	/** Peaks below this don't count, dBm; absent: none is too low. */
	thresholdDbm?: number;
	/** How far the trace must fall on both sides before it rises higher again, dB; absent: 6. */
	excursionDb?: number;
}

/**
 * Points that are peaks, from the first to the last: the trace rises by `excursionDb` to each and falls by as much after it.
 * @param levelsDbm the trace
 */
export function findPeaks(levelsDbm: ArrayLike<number>, rule: PeakRule = {}): number[] {
	const { thresholdDbm = -Infinity, excursionDb = 6 } = rule;
	const peaks: number[] = [];
	const differs = (high: number, low: number) =>
		levelsDbm[high] > levelsDbm[low] && levelsDbm[high] - levelsDbm[low] >= excursionDb;
	let rising = false;
	// The highest point since the last valley while rising, the lowest since the last peak while not.
	let best = 0;
	for (let i = 1; i < levelsDbm.length; i++) {
		if (rising ? levelsDbm[i] > levelsDbm[best] : levelsDbm[i] < levelsDbm[best]) best = i;
		else if (rising ? differs(best, i) : differs(i, best)) {
			if (rising) peaks.push(best);
			rising = !rising;
			best = i;
		}
	}
	return peaks.filter((index) => levelsDbm[index] >= thresholdDbm);
}

/** The nearest peak on one side of a point, or null. */
export function nextPeak(
	levelsDbm: ArrayLike<number>,
	from: number,
	side: Side,
	rule: PeakRule = {}
): number | null {
	const peaks = findPeaks(levelsDbm, rule);
	const found = side === 'upper' ? peaks.find((i) => i > from) : peaks.findLast((i) => i < from);
	return found ?? null;
}

/** The highest point. */
export const highestPoint = (levelsDbm: ArrayLike<number>): number => extreme(levelsDbm, (a, b) => a > b);
/** The lowest point. */
export const lowestPoint = (levelsDbm: ArrayLike<number>): number => extreme(levelsDbm, (a, b) => a < b);

function extreme(levelsDbm: ArrayLike<number>, beats: (level: number, best: number) => boolean): number {
	let best = 0;
	for (let i = 1; i < levelsDbm.length; i++) if (beats(levelsDbm[i], levelsDbm[best])) best = i;
	return best;
}
