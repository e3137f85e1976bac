/** A receiver's own errors: drawn once per attempt, the same for everything it shows. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { Random, type Seed } from './random';

export interface ReceiverError {
	/** ε: displayed frequency = true·(1 + ε). */
	frequency: number;
	/** Error of a displayed level at a displayed frequency, dB. */
	levelDb(frequencyHz: number): number;
}

/**
 * ε uniform within ±referencePpm; level error E·(0.7u₀ + 0.3u₁·sin(2π·log₁₀(f/1 MHz) + φ)), u uniform in ±1, E = levelErrorDb.
 */
export function drawReceiverError(profile: ReceiverProfile, seed: Seed): ReceiverError {
	const random = new Random(seed, -1, 'receiver error');
	const both = (): number => 2 * random.uniform() - 1;
	const frequency = profile.referencePpm * 1e-6 * both();
	const fixed = 0.7 * both();
	const wave = 0.3 * both();
	const phase = 2 * Math.PI * random.uniform();
	return {
		frequency,
		levelDb: (frequencyHz) =>
			profile.levelErrorDb *
			(fixed + wave * Math.sin(2 * Math.PI * Math.log10(Math.max(frequencyHz, 1) / 1e6) + phase))
	};
}
