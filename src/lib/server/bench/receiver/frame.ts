/**
 * The time frame of a sweep. Everything is computed in the intermediate-frequency frame (mixed down by the chirp) on one lattice:
 * sample n stands at n·stepS from the sweep's start, n = 0 at the start of the first bucket;
 * bucket b owns samples b·perBucket … (b+1)·perBucket, both ends included, and its point is the middle one.
 */
import { chirpFactor, gaussianConstant } from './resolution-filter';
import type { SweptSettings } from './swept-settings';

export interface Frame {
	points: number;
	rbwHz: number;
	vbwHz: number;
	/** c of the resolution filter, s². */
	c: number;
	/** Tuned (true) frequency at n = 0, and how it rises; 0 in zero span. */
	startHz: number;
	sweepHzPerS: number;
	/** k = c·S/π. */
	chirp: number;
	/** Length of a bucket, s; of a sample, s; samples to a bucket (even). */
	bucketS: number;
	stepS: number;
	perBucket: number;
	/** Samples kept before n = 0 and after the last bucket, for interpolation. */
	lead: number;
	trail: number;
	/** All samples: lead + points·perBucket + 1 + trail. */
	total: number;
}

/** Samples to a bucket: 8 per 1/B for peaks, 6 for averages (Simpson's rule needs an even number). */
export const samplesPerBucket = (rbwHz: number, bucketS: number, peaks: boolean): number =>
	2 * Math.max(1, Math.ceil((peaks ? 4 : 3) * rbwHz * bucketS));

/** Seconds a bucket lasts: T/(points − 1). */
export const bucketSeconds = ({ sweepTimeS, points }: Pick<SweptSettings, 'sweepTimeS' | 'points'>): number =>
	sweepTimeS / (points - 1);

/**
 * @param frequencyError the receiver's reference error ε: it shows true·(1+ε), so it is tuned to shown/(1+ε)
 */
export function makeFrame(settings: SweptSettings, frequencyError: number, perBucket: number): Frame {
	const bucketS = bucketSeconds(settings);
	const stepS = bucketS / perBucket;
	const spanHz = settings.spanHz / (1 + frequencyError);
	const sweepHzPerS = spanHz / settings.sweepTimeS;
	const lead = 2;
	const trail = 2;
	return {
		points: settings.points,
		rbwHz: settings.rbwHz,
		vbwHz: settings.vbwHz,
		c: gaussianConstant(settings.rbwHz),
		startHz: settings.startHz / (1 + frequencyError) - (sweepHzPerS * bucketS) / 2,
		sweepHzPerS,
		chirp: chirpFactor(settings.rbwHz, sweepHzPerS),
		bucketS,
		stepS,
		perBucket,
		lead,
		trail,
		total: lead + settings.points * perBucket + 1 + trail
	};
}

/** Tuned frequency at array index i (index 0 is n = −lead), Hz. */
export const tunedHz = (frame: Frame, index: number): number =>
	frame.startHz + frame.sweepHzPerS * (index - frame.lead) * frame.stepS;
