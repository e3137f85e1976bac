import type { ReceiverProfile } from '$lib/schemas/receiver';
import { NOISE_PER_RBW } from '$lib/measure/resolution-filter';
import type { FilteredSkirt } from './filtered-skirt';
import { floorDensity } from './floor';
import type { FrontEndSettings } from './front-end-settings';
import { filteredSkirtOf, phaseNoiseSkirt, type PhaseNoise } from './skirt-shape';

/** How the receiver looks at what reaches it. */
export interface View {
	rbwHz: number;
	startHz: number;
	/** Distance between points, Hz. */
	spacingHz: number;
	/** The receiver's own noise through the filter, mW, against tuned frequency. */
	floorMw(frequencyHz: number): number;
	/** The least of it in the sweep. */
	leastFloorMw: number;
	/** The local oscillator's phase noise. */
	receiver: PhaseNoise | null;
	/** A skirt through the resolution filter, tabulated once. */
	filteredSkirt(noise: PhaseNoise): FilteredSkirt;
}

export function viewOf(profile: ReceiverProfile, settings: FrontEndSettings): View {
	const { rbwHz, startHz, stopHz, centreHz, spanHz, points } = settings;
	const density = floorDensity(profile, settings);
	const noiseBandwidthHz = NOISE_PER_RBW * rbwHz;
	const floorMw = (frequencyHz: number) => noiseBandwidthHz * density(frequencyHz);
	return {
		rbwHz,
		startHz,
		spacingHz: spanHz / (points - 1),
		floorMw,
		leastFloorMw: Math.min(...[startHz, centreHz, stopHz].map(floorMw)),
		receiver: profile.phaseNoise && phaseNoiseSkirt(profile.phaseNoise, 'receiver.phaseNoise'),
		filteredSkirt: (noise) => filteredSkirtOf(noise, rbwHz)
	};
}
