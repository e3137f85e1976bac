/** Power in a band, with its spread and remarks: what all the integrals share. */
import { powerRatioToDb } from '$lib/units/decibel';
import { pointsOf, type Stretch, stretchOf, sumCells } from './cells';
import { noiseShare } from './noise-share';
import { sumSpreadDb } from './noise-statistics';
import { needsSpan, type NoNumber, outsideTrace } from './reader';
import type { Remark } from './remark';
import { integralRemarks, outsideRemark } from './remarks';
import { isZeroSpan, type Trace } from './trace';

export interface BandPower {
	levelDbm: number;
	/** One standard deviation, dB: the noise-like share of it over the independent values in the band. */
	spreadDb: number;
	remarks: Remark[];
	stretch: Stretch;
}

/**
 * Power between two frequencies.
 * @param weight share of a cell that counts, by its place in points; absent: what lies inside
 */
export function bandPower(
	trace: Trace,
	startHz: number,
	stopHz: number,
	weight?: (index: number) => number
): BandPower | NoNumber {
	if (isZeroSpan(trace)) return needsSpan();
	const stretch = stretchOf(trace, startHz, stopHz);
	if (!stretch) return outsideTrace(`${startHz} to ${stopHz} Hz`);
	const { powerMw, effectivePoints } = sumCells(trace, stretch, weight);
	const { first, last } = pointsOf(stretch);
	const share = noiseShare(trace, first, last);
	return {
		levelDbm: powerRatioToDb(powerMw),
		spreadDb: share * sumSpreadDb(trace, effectivePoints),
		remarks: [...integralRemarks(trace, stopHz - startHz, share), ...(stretch.cut ? [outsideRemark()] : [])],
		stretch
	};
}

export const channelOf = (centreHz: number, widthHz: number): [startHz: number, stopHz: number] => [
	centreHz - widthHz / 2,
	centreHz + widthHz / 2
];
