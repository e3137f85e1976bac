/** Remarks that several kinds of reading share. */
import { shareAround } from './line-level';
import { isNoiseLike } from './noise-share';
import { isAveraged, isHeld, isSweptTooFast, sweepTimeS } from './noise-statistics';
import { type Remark, remark } from './remark';
import { sweepLossDb } from './resolution-filter';
import { isZeroSpan, spanHz, stepHz, type Trace } from './trace';

/** Each code once, the first of its kind. */
export const once = (remarks: Remark[]): Remark[] =>
	remarks.filter(({ code }, i) => remarks.findIndex((other) => other.code === code) === i);

/** The sweep ran faster than the filters follow: every kind of reading says so. */
export function sweepRemarks(trace: Trace): Remark[] {
	if (!isSweptTooFast(trace)) return [];
	const lossDb = sweepLossDb(spanHz(trace) / sweepTimeS(trace), trace.rbwHz);
	return [
		remark(
			'sweep-too-fast',
			`The sweep is too fast for its filters: lines read ${lossDb.toFixed(2)} dB low, wide and late.`
		)
	];
}

/** On noise, what detector and trace mode do to a level; nothing when they show it as it is. */
export function noiseRemarks(trace: Trace): Remark[] {
	const found: Remark[] = [];
	if (trace.detector === 'positive-peak' || trace.detector === 'rise-fall') {
		found.push(
			remark(
				'detector-peak-on-noise',
				'A peak detector shows the crests of noise, several dB above its power.'
			)
		);
	}
	if (trace.detector === 'negative-peak') {
		found.push(
			remark('detector-minimum', 'A minimum detector shows the troughs of noise, far below its power.')
		);
	}
	if (isHeld(trace)) {
		found.push(
			remark(
				'held-noise',
				'A held trace keeps the extremes of noise and drifts away from its power with every sweep.'
			)
		);
	}
	return found;
}

/** What stands in the way of a line's level at a point. */
export const lineRemarks = (trace: Trace, index: number): Remark[] =>
	// a signal spread like noise has no line between its points to miss
	isNoiseLike(shareAround(trace, index)) ? noiseRemarks(trace) : sparseLineRemarks(trace);

/**
 * Points too far apart for a detector that looks only at the points themselves.
 * @param largestStep over the resolution bandwidth: a quarter, where a line may stand 0.19 dB above the nearest point
 */
export function sparseLineRemarks(trace: Trace, largestStep = 1 / 4): Remark[] {
	const looksBetween = trace.detector === 'positive-peak' || trace.detector === 'rise-fall';
	if (isZeroSpan(trace) || looksBetween || stepHz(trace) <= trace.rbwHz * largestStep) return [];
	return [
		remark(
			'too-few-points',
			'The points lie too far apart for this resolution: a line between two of them reads low.'
		)
	];
}

/** The same for readings that find the top of a line between the points, as they can up to half a resolution bandwidth apart. */
export const unresolvedLineRemarks = (trace: Trace): Remark[] => sparseLineRemarks(trace, 1 / 2);

/**
 * What an integral over a band of `widthHz` needs of the trace.
 * @param share how much of it behaves as noise, 0 to 1
 * @param largestRbwShare of the width that the resolution bandwidth may be
 */
export function integralRemarks(
	trace: Trace,
	widthHz: number,
	share: number,
	largestRbwShare = 0.05
): Remark[] {
	const found = isNoiseLike(share) ? noiseRemarks(trace) : [];
	if (isNoiseLike(share) && trace.scale !== 'power' && isAveraged(trace)) {
		const lowDb = trace.scale === 'log' ? '2.5' : '1.05';
		found.push(
			remark(
				'not-a-power-scale',
				`The trace is an average on the ${trace.scale} scale: noise-like power reads up to ${lowDb} dB low.`
			)
		);
	}
	// Beyond B/2 the sum depends on where the points fall: ±0.24 dB for a line at Δ = B (Poisson's sum).
	if (stepHz(trace) > trace.rbwHz / 2) {
		found.push(
			remark(
				'too-few-points',
				'The points lie more than half a resolution bandwidth apart: a sum over them misses power.'
			)
		);
	}
	if (trace.rbwHz > widthHz * largestRbwShare) {
		found.push(
			remark(
				'rbw-too-wide',
				`The resolution bandwidth is more than ${100 * largestRbwShare} % of this width: power leaks across its edges.`
			)
		);
	}
	return found;
}

export const outsideRemark = (): Remark =>
	remark('window-outside-span', 'Part of the band lies outside the trace and is not counted.');
