/** Noise density around a frequency, from a trace on any scale. */
import { powerRatioToDb } from '$lib/units/decibel';
import { noiseSpreadDb, pointSpreadDb } from './noise-statistics';
import { noNumber, type NoNumber, outsideTrace } from './reader';
import { type Remark, remark } from './remark';
import { noiseRemarks, outsideRemark } from './remarks';
import { noiseBandwidthHz } from './resolution-filter';
import { meanOnScaleDbm, noiseBiasDb } from './scale';
import { covers, isZeroSpan, positionOf, spanHz, stepHz, type Trace } from './trace';

export interface NoiseDensity {
	dbmPerHz: number;
	/** What the trace itself shows there, in its resolution bandwidth: the mean of its powers. */
	shownDbm: number;
	spreadDb: number;
	remarks: Remark[];
}

/**
 * Mean of the trace on its own scale within ± `halfWidthHz`, less the noise bandwidth, plus what that scale's mean of noise
 * lies under its power: 2.507 dB on log, 1.049 on voltage, 0 on power.
 * @param halfWidthHz absent: 2.5 % of the span
 */
export function noiseDensityAt(
	trace: Trace,
	atHz: number,
	halfWidthHz: number = 0.025 * spanHz(trace)
): NoiseDensity | NoNumber {
	if (!covers(trace, atHz)) return outsideTrace(`${atHz} Hz`);
	const window = pointsWithin(trace, atHz, halfWidthHz);
	if (window.last < window.first)
		return noNumber('No point lies in the window.', 'more points or a narrower span');
	const meanDbm = meanOnScaleDbm(trace.levelsDbm, window.first, window.last, trace.scale);
	return {
		dbmPerHz: meanDbm - powerRatioToDb(noiseBandwidthHz(trace.rbwHz)) + noiseBiasDb[trace.scale],
		shownDbm: meanOnScaleDbm(trace.levelsDbm, window.first, window.last, 'power'),
		spreadDb: noiseSpreadDb(trace, window.last - window.first + 1, trace.scale),
		remarks: [
			...noiseRemarks(trace),
			...(holdsSignal(trace, window.first, window.last, meanDbm) ? [signalRemark()] : []),
			...(window.cut ? [outsideRemark()] : [])
		]
	};
}

const signalRemark = (): Remark =>
	remark('signal-in-window', 'Something stands out of the noise in the window and is averaged with it.');

/** In span 0 all points are at the one frequency. */
function pointsWithin(
	trace: Trace,
	atHz: number,
	halfWidthHz: number
): { first: number; last: number; cut: boolean } {
	const lastPoint = trace.levelsDbm.length - 1;
	if (isZeroSpan(trace)) return { first: 0, last: lastPoint, cut: false };
	const at = positionOf(trace, atHz);
	const half = halfWidthHz / stepHz(trace);
	const first = Math.ceil(at - half - 1e-9);
	const last = Math.floor(at + half + 1e-9);
	// A window narrower than a step holds the nearest point.
	if (last < first) return { first: Math.round(at), last: Math.round(at), cut: false };
	return { first: Math.max(0, first), last: Math.min(lastPoint, last), cut: first < 0 || last > lastPoint };
}

/**
 * Whether the highest point lies higher than chance takes noise: five deviations of a point over the mean, which for single values
 * is 13.5 dB and no more, since their crests die out as e^−x.
 */
function holdsSignal(trace: Trace, first: number, last: number, meanDbm: number): boolean {
	let top = -Infinity;
	for (let i = first; i <= last; i++) top = Math.max(top, trace.levelsDbm[i]);
	return top - meanDbm > Math.min(13.5, Math.max(5 * pointSpreadDb(trace), 2));
}
