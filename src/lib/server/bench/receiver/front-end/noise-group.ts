/** What of the noise shares one coming and going. */
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { frequencyAtShare } from '$lib/server/bench/signal/regrowth-clusters';
import type { CarriedDensity } from './carried';
import { densityShare } from './density-share';
import type { SpectrumPart } from './filtered-power';
import type { PhaseNoise } from './skirt-shape';
import { densitySources, wholeSources, type SkirtSource } from './skirt-source';
import { spectrumPart } from './spectrum-part';
import { NOISE_BANDWIDTH_PER_RBW, type View } from './view';

export interface NoiseGroup {
	parts: SpectrumPart[];
	/** What each phase noise rides on. */
	skirted: Map<PhaseNoise, SkirtSource[]>;
	/** Densities that fade at their own width. */
	narrow: CarriedDensity[];
}

export const emptyGroup = (): NoiseGroup => ({ parts: [], skirted: new Map(), narrow: [] });

/** A spread spectrum this far under the floor at its top is left out, as a power ratio. */
const NEGLIGIBLE = 1e-4;

/** Width between half-power points of a flat band, and near it for others: twice the middle half of the power, Hz. */
export const narrowWidthHz = (density: Density): number =>
	2 * (frequencyAtShare(density, 0.75) - frequencyAtShare(density, 0.25));

export function addSkirts(group: NoiseGroup, noise: PhaseNoise, sources: SkirtSource[]): void {
	const known = group.skirted.get(noise);
	if (known) known.push(...sources);
	else group.skirted.set(noise, sources);
}

/** Adds a density as what the filter makes of it: a spectrum, a process of its own width, or only its skirts. */
export function addDensity(group: NoiseGroup, carried: CarriedDensity, view: View): void {
	const { density, own, gainAt, finestHz } = carried;
	const { receiver, rbwHz } = view;
	const share = densityShare(carried);
	const isNarrow = own !== undefined && density.stopHz - density.startHz < rbwHz / 2;
	const isWhole = isNarrow || own?.waveform !== undefined;
	if (isNarrow && !own.waveform) group.narrow.push(carried);
	if (!isWhole) {
		const gain = share * (receiver?.lineShare ?? 1);
		group.parts.push(spectrumPart(density, finestHz, (frequencyHz) => gain * gainAt(frequencyHz)));
	}
	// What grew is far enough under what it grew from for its skirts to vanish under that one's.
	if (!own || !receiver || !skirtShows(density, receiver, view)) return;
	const powerMw = share * density.powerMw;
	addSkirts(
		group,
		receiver,
		isWhole ? wholeSources(density, powerMw, rbwHz) : densitySources(density, powerMw, gainAt)
	);
}

function skirtShows(density: Density, receiver: PhaseNoise, { leastFloorMw, rbwHz }: View): boolean {
	const top = density.powerMw * receiver.densityPerHz(0);
	return top * NOISE_BANDWIDTH_PER_RBW * rbwHz > NEGLIGIBLE * leastFloorMw;
}
