/** What of the noise shares one coming and going. */
import { NOISE_PER_RBW } from '$lib/measure/resolution-filter';
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { frequencyAtShare } from '$lib/server/bench/signal/regrowth-clusters';
import type { CarriedDensity } from './carried';
import { densityShare } from './density-share';
import type { SpectrumPart } from './filtered-power';
import type { PhaseNoise } from './skirt-shape';
import { densitySources, wholeSources, type SkirtSource } from './skirt-source';
import { spectrumPart } from './spectrum-part';
import type { View } from './view';

export interface NoiseGroup {
	parts: SpectrumPart[];
	/** What each phase noise rides on. */
	skirted: Map<PhaseNoise, SkirtSource[]>;
	/** Densities that fade at their own width. */
	narrow: CarriedDensity[];
	/** Spectra that count only while tuned outside a stretch: inside it, their waveform is followed. */
	fenced: { part: SpectrumPart; fromHz: number; toHz: number }[];
}

export const emptyGroup = (): NoiseGroup => ({ parts: [], skirted: new Map(), narrow: [], fenced: [] });

/** An MSK waveform is followed to this many bit rates from its carrier, and as many B beyond. */
const FOLLOWED_BITS = 1.5;
const FOLLOWED_RBW = 2.5;
/** Top of its spectrum beyond that against the middle, as a power ratio. */
const FAR_LOBES = 1e-4;

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
	const gain = share * (receiver?.lineShare ?? 1);
	const part = () => spectrumPart(density, finestHz, (frequencyHz) => gain * gainAt(frequencyHz));
	if (!isWhole) group.parts.push(part());
	if (own?.waveform?.kind === 'msk' && farLobesShow(density, own.waveform.bitRateHz, view)) {
		const { frequencyHz, bitRateHz } = own.waveform;
		const reachHz = FOLLOWED_BITS * bitRateHz + FOLLOWED_RBW * rbwHz;
		group.fenced.push({ part: part(), fromHz: frequencyHz - reachHz, toHz: frequencyHz + reachHz });
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

const farLobesShow = (density: Density, bitRateHz: number, { leastFloorMw, rbwHz }: View): boolean =>
	(FAR_LOBES * density.powerMw * NOISE_PER_RBW * rbwHz) / bitRateHz > NEGLIGIBLE * leastFloorMw;

function skirtShows(density: Density, receiver: PhaseNoise, { leastFloorMw, rbwHz }: View): boolean {
	const top = density.powerMw * receiver.densityPerHz(0);
	return top * NOISE_PER_RBW * rbwHz > NEGLIGIBLE * leastFloorMw;
}
