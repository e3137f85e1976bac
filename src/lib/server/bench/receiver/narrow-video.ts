/** Where a video filter starts when it is too slow to be run in. */
import type { Frame } from './frame';
import { videoRunInS } from './video';

/** Longest run-in that is followed sample by sample, in 1/B. */
const LONGEST_RUN_IN = 400;

/** Run-in a sampled sweep gives its video filter, s. */
export const sampledRunInS = (vbwHz: number, rbwHz: number): number =>
	Math.min(videoRunInS(vbwHz), LONGEST_RUN_IN / rbwHz);

/**
 * The video filter's state at the first sample: the video itself where the run-in lets it forget,
 * else the mean over the run-in, since a filter that slow rests near the mean
 * (deviation √(π·VBW/(1.846·B)) of the log scale's 5.57 dB: below 0.25 dB here).
 */
export function startOfVideo(frame: Frame, video: Float64Array): number {
	if ((frame.lead - 2) * frame.stepS >= 0.999 * videoRunInS(frame.vbwHz) || frame.lead < 3) return video[0];
	let sum = 0;
	for (let i = 0; i < frame.lead; i++) sum += video[i];
	return sum / frame.lead;
}
