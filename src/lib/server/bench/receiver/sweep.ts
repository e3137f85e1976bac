/** From a scene and a receiver to rows: the one door to the sweep. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { prepareIncident } from './front-end/prepare-incident';
import type { Seed } from './random';
import { drawReceiverError } from './receiver-error';
import { planSweep, type SweepPlan } from './sweep-plan';

/** Prepares a sweep. Errors: BenchError with the field, from the front end. */
export function prepareSweep(
	scene: Scene,
	profile: ReceiverProfile,
	settings: ResolvedSettings,
	seed: Seed
): SweepPlan {
	return planSweep(
		prepareIncident(scene, profile, settings, seed),
		settings,
		drawReceiverError(profile, seed),
		seed
	);
}
