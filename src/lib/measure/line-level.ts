/** How sure the level of one point or one line is. */
import { isNoiseLike, noiseShare } from './noise-share';
import { independentLag, pointSpreadDb } from './noise-statistics';
import { isZeroSpan, stepHz, type Trace } from './trace';

/** How much of what stands around a point behaves as noise: over the width of the filter, and enough independent points to tell. */
export function shareAround(trace: Trace, index: number): number {
	const last = trace.levelsDbm.length - 1;
	const acrossLine = isZeroSpan(trace) ? 0 : trace.rbwHz / stepHz(trace);
	const reach = Math.ceil(Math.max(8 * independentLag(trace), Math.min(acrossLine, last)));
	return noiseShare(trace, Math.max(0, index - reach), Math.min(last, index + reach));
}

/**
 * Deviation in dB of the level at a point: what noise adds there, and what a line between two points loses.
 * @param index the point
 */
export function levelSpreadDb(trace: Trace, index: number): number {
	const share = shareAround(trace, index);
	return Math.hypot(share * pointSpreadDb(trace), isNoiseLike(share) ? 0 : betweenPointsDb(trace));
}

/**
 * Deviation in dB of what a line loses by standing between two points: 12.04·(x/B)² dB for x uniform within half a step, of which the
 * deviation is √(4/45). Peak detectors find the line wherever it stands.
 */
export function betweenPointsDb(trace: Trace): number {
	if (trace.detector === 'positive-peak' || trace.detector === 'rise-fall') return 0;
	return Math.min(3, 10 * Math.log10(2) * Math.sqrt(4 / 45) * (stepHz(trace) / trace.rbwHz) ** 2);
}
