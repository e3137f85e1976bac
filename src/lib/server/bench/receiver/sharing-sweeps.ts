/** Many set-ups on one signal, each thing made once: what reaches the filter, and what rows detect. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { FrontEndSettings } from './front-end/front-end-settings';
import { prepareIncident } from './front-end/prepare-incident';
import type { Incident } from './incident';
import type { Seed } from './random';
import { drawReceiverError } from './receiver-error';
import { detectedRows, planSweep, type DetectedRows, type SweepPlan } from './sweep-plan';
import type { SweptSettings } from './swept-settings';

const frontEndOf = ({ startHz, stopHz, centreHz, spanHz, points, ...rest }: FrontEndSettings) => {
	const { rbwHz, sweepTimeS, attenuationDb, preamp, input } = rest;
	return { startHz, stopHz, centreHz, spanHz, points, rbwHz, sweepTimeS, attenuationDb, preamp, input };
};

/**
 * The same sweeps as `prepareSweep` prepares, for many set-ups of one receiver on one scene with one seed: set-ups that differ in
 * detector, scale, video filter or correction share what reaches the filter, and those that differ in correction share rows.
 * Every row stays in memory: let go of it with the scene.
 * @throws BenchError with the field, from the front end
 */
export function sharingSweeps(
	scene: Scene,
	profile: ReceiverProfile,
	seed: Seed
): (settings: ResolvedSettings) => SweepPlan {
	const error = drawReceiverError(profile, seed);
	const incidents = new Map<string, Incident>();
	const rows = new Map<string, DetectedRows>();
	return (settings) => {
		const frontEnd: FrontEndSettings = frontEndOf(settings);
		const frontEndKey = JSON.stringify(frontEnd);
		const incident = incidents.get(frontEndKey) ?? prepareIncident(scene, profile, frontEnd, seed);
		incidents.set(frontEndKey, incident);
		const { vbwHz, detector, scale } = settings;
		const swept: SweptSettings = { ...frontEnd, vbwHz, detector, scale };
		const key = JSON.stringify(swept);
		return planSweep(incident, settings, error, seed, () => {
			const made = rows.get(key) ?? keeping(detectedRows(incident, swept, error.frequency, seed));
			rows.set(key, made);
			return made;
		});
	};
}

function keeping(detected: DetectedRows): DetectedRows {
	const kept = new Map<string, Float64Array>();
	return (n, clockS) => {
		const key = `${n} ${clockS}`;
		const row = kept.get(key) ?? detected(n, clockS).slice();
		kept.set(key, row);
		return row;
	};
}
