/** What of the noise shares one coming and going. */
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { frequencyAtShare } from '$lib/server/bench/signal/regrowth-clusters';
import type { CarriedDensity } from './carried';
import { densityShare } from './density-share';
import { densitySkirt } from './density-skirt';
import type { SpectrumPart } from './filtered-power';
import { SKIRT_FROM_RBW } from './filtered-skirt';
import type { SkirtedLine } from './line-skirts';
import { spectrumPart } from './spectrum-part';
import { NOISE_BANDWIDTH_PER_RBW, type View } from './view';

export interface NoiseGroup {
	parts: SpectrumPart[];
	skirted: SkirtedLine[];
	/** Densities that fade at their own width. */
	narrow: CarriedDensity[];
}

export const emptyGroup = (): NoiseGroup => ({ parts: [], skirted: [], narrow: [] });

/** Lines that stand for a spectrum whose skirt matters only away from it. */
const STAND_INS = 16;
/** Share of the power on either side that such a spectrum's width leaves out. */
const OUTSIDE = 0.005;
/** A spread spectrum this far under the floor at its top is left out, as a power ratio. */
const NEGLIGIBLE = 1e-4;
/** Detail no filter can see, in B. */
const FINEST_RBW = 1 / 8;

/** Width between half-power points of a flat band, and near it for others: twice the middle half of the power, Hz. */
export const narrowWidthHz = (density: Density): number =>
	2 * (frequencyAtShare(density, 0.75) - frequencyAtShare(density, 0.25));

/** Adds a density as what the filter makes of it: a spectrum, a process of its own width, or only its skirts. */
export function addDensity(group: NoiseGroup, carried: CarriedDensity, view: View): void {
	const { density, own, gainAt } = carried;
	if (own?.waveform) {
		addStandIns(group, carried, view);
		return;
	}
	if (own && density.stopHz - density.startHz < view.rbwHz / 2) {
		group.narrow.push(carried);
		addStandIns(group, carried, view);
		return;
	}
	const share = densityShare(carried);
	const lineShare = view.receiver?.lineShare ?? 1;
	group.parts.push(spectrumPart(density, (frequencyHz) => share * lineShare * gainAt(frequencyHz)));
	// What grew is far enough under what it grew from for its skirts to vanish under that one's.
	if (own && view.receiver && skirtShows(density, view)) {
		const whole = spectrumPart(density, (frequencyHz) => share * gainAt(frequencyHz));
		group.parts.push(densitySkirt(whole, view.receiver, view.rbwHz * FINEST_RBW));
	}
}

function skirtShows(density: Density, { receiver, leastFloorMw, rbwHz }: View): boolean {
	if (!receiver) return false;
	const top = density.powerMw * receiver.densityPerHz(0);
	return top * NOISE_BANDWIDTH_PER_RBW * rbwHz > NEGLIGIBLE * leastFloorMw;
}

/** Near it, a signal's skirt is phase and not power; farther out it is that of as many lines of equal power. */
function addStandIns(group: NoiseGroup, carried: CarriedDensity, view: View): void {
	const { density } = carried;
	if (!view.receiver || !skirtShows(density, view)) return;
	const startHz = frequencyAtShare(density, OUTSIDE);
	const stopHz = frequencyAtShare(density, 1 - OUTSIDE);
	const skirt = view.filteredSkirt(view.receiver);
	for (let i = 0; i < STAND_INS; i++) {
		group.skirted.push({
			frequencyHz: frequencyAtShare(density, (i + 0.5) / STAND_INS),
			powerMw: (densityShare(carried) * density.powerMw) / STAND_INS,
			skirt,
			fromHz: (stopHz - startHz) / 2 + SKIRT_FROM_RBW * view.rbwHz,
			aboutHz: (startHz + stopHz) / 2
		});
	}
}
