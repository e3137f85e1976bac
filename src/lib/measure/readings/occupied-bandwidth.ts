/** The width between the frequencies below and above which half of the rest of the power lies (RR 1.153: 0.5 % for 99 %). */
import { channelOf } from '../band';
import { stretchOf, wholeStretch } from '../cells';
import { type Cumulative, cumulativeOf, edgeAtShare } from '../cumulative';
import { noiseShare } from '../noise-share';
import { needsSpan, outsideTrace, type Reader } from '../reader';
import { type Remark, remark } from '../remark';
import { integralRemarks, outsideRemark } from '../remarks';
import { isZeroSpan } from '../trace';

/** Beyond this the filter adds more than 0.5 % to the width. */
const LARGEST_RBW_SHARE = 0.03;
/** Noise in the window over the power in it: −34 dB, so that 35 dB of signal over noise is still enough. */
const LARGEST_NOISE_SHARE = 10 ** -3.4;

export const occupiedBandwidth: Reader<'occupied-bandwidth'> = (trace, { centreHz, widthHz, percent }) => {
	if (isZeroSpan(trace)) return needsSpan();
	const windowed = centreHz !== undefined && widthHz !== undefined;
	const stretch = windowed ? stretchOf(trace, ...channelOf(centreHz, widthHz)) : wholeStretch(trace);
	if (!stretch) return outsideTrace('The window');
	const cumulative = cumulativeOf(trace, stretch);
	const outside = (1 - percent / 100) / 2;
	const lower = edgeAtShare(trace, cumulative, outside);
	const upper = edgeAtShare(trace, cumulative, 1 - outside);
	const value = upper.frequencyHz - lower.frequencyHz;
	const share = noiseShare(trace, cumulative.first, cumulative.first + cumulative.shares.length - 1);
	return {
		value,
		unit: 'Hz',
		spread: share * Math.hypot(lower.noiseSpreadHz, upper.noiseSpreadHz),
		remarks: [
			...integralRemarks(trace, value, share, LARGEST_RBW_SHARE),
			...edgeRemarks(cumulative),
			...(stretch.cut ? [outsideRemark()] : [])
		],
		parts: { lowerHz: lower.frequencyHz, upperHz: upper.frequencyHz }
	};
};

/** What the ends of the window say: noise that counts as signal, or a signal that goes on beyond it. */
function edgeRemarks({ shares }: Cumulative): Remark[] {
	const twentieth = Math.floor(shares.length / 20);
	if (twentieth < 1) return [];
	const meanOf = (from: number) =>
		shares.subarray(from, from + twentieth).reduce((a, b) => a + b, 0) / twentieth;
	const ends = [
		{ outer: meanOf(0), inner: meanOf(twentieth) },
		{ outer: meanOf(shares.length - twentieth), inner: meanOf(shares.length - 2 * twentieth) }
	];
	if (ends.some(({ outer }) => outer * shares.length > 0.3)) {
		return [
			remark(
				'window-too-narrow',
				'The power goes on to the edge of the window: what lies beyond it is not counted.'
			)
		];
	}
	// Noise is level at the ends, skirts of the signal still fall.
	const floors = ends.filter(({ outer, inner }) => inner < 1.5 * outer).map(({ outer }) => outer);
	const noise = floors.length > 0 ? Math.min(...floors) * shares.length : 0;
	if (noise <= LARGEST_NOISE_SHARE) return [];
	const percent = (100 * noise).toPrecision(2);
	return [
		remark(
			'window-too-wide-for-snr',
			`About ${percent} % of the power in the window is noise: it pushes the edges outwards.`
		)
	];
}
