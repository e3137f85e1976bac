import type { Timing } from '../incident';
import { pacemaker, type CarriedLine } from './carried';
import { placesHz } from './connect';

/** When and where a line made of these is. It moves as often as each emitter counts: a second harmonic drifts twice as fast. */
export function timingOf({ frequencyHz, origins }: CarriedLine): Timing | undefined {
	const drifting = origins.filter(({ arrival }) => arrival.timing?.driftHzPerS !== undefined);
	const main = pacemaker(origins.map(({ arrival }) => arrival));
	const followed = origins.find(({ arrival }) => arrival === main && arrival.timing) ?? drifting[0];
	if (!followed?.arrival.timing) return undefined;
	const timing = { ...followed.arrival.timing };
	if (timing.hop) timing.hop = { ...timing.hop, channelsHz: placesHz(frequencyHz, [followed]) };
	if (drifting.length > 0) {
		timing.driftHzPerS = drifting.reduce(
			(sum, { arrival, order }) => sum + order * (arrival.timing?.driftHzPerS ?? 0),
			0
		);
	}
	return timing;
}
