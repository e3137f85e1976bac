/** What the receiver itself puts on the screen, against what is looked for there. */
import { noiseBandwidthHz } from '$lib/measure/resolution-filter';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { floorDensity } from '$lib/server/bench/receiver/front-end/floor';
import { milliwattsToDbm } from '$lib/units/decibel';
import { mixerGainDb } from '$lib/server/bench/grading/mixer';
import type { SweptSetUp } from './set-up-at';

/** Level at the connector, dBm, of what has `levelDbm` at the reference plane: lead and pad taken off. */
export const shownDbm = (
	{ scene }: SweptSetUp['drawn'],
	{ input }: ResolvedSettings,
	atHz: number,
	levelDbm: number
): number => levelDbm - (scene.path ? lossDbAt(scene.path, atHz) : 0) - input.padDb;

/** Mean power of the receiver's own noise through its resolution filter, referred to the connector, dBm. */
export const ownNoiseDbm = (profile: ReceiverProfile, resolved: ResolvedSettings, atHz: number): number =>
	milliwattsToDbm(floorDensity(profile, resolved)(atHz) * noiseBandwidthHz(resolved.rbwHz));

/**
 * How far the mixer's own third-order products lie below two equal tones, dB: 2·(TOI − P) with P a tone at the mixer
 * (2f₁ − f₂ stands at 3P − 2·TOI: `signal/nonlinearity.ts`). Infinite for a mixer without any.
 */
export function ownProductsDb(
	drawn: SweptSetUp['drawn'],
	resolved: ResolvedSettings,
	atHz: number,
	toneDbm: number
): number {
	const { toiDbm } = drawn.profile;
	if (toiDbm === null) return Infinity;
	return 2 * (toiDbm - (shownDbm(drawn, resolved, atHz, toneDbm) + mixerGainDb(resolved, drawn.profile)));
}
