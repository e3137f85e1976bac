/** Everything that reaches the filter as Gaussian noise: floor, densities, what they grew, skirts beyond the filter. */
import type { IncidentNoise } from '../incident';
import type { Arrival } from './arrival';
import { pacemaker, type CarriedDensity } from './carried';
import { densityShare } from './density-share';
import { FilteredPower, type SpectrumPart } from './filtered-power';
import type { ArrivedLine } from './incident-lines';
import { addDensity, addSkirts, emptyGroup, narrowWidthHz, type NoiseGroup } from './noise-group';
import { SkirtField } from './skirt-field';
import { lineSource, movingLineSource } from './skirt-source';
import { spectrumPart } from './spectrum-part';
import type { View } from './view';

/**
 * Noises of an incident: first the receiver's floor with everything in it that is always on, then one for each schedule,
 * then those that fade at a width of their own.
 */
export function incidentNoises(
	densities: readonly CarriedDensity[],
	lines: readonly ArrivedLine[],
	view: View
): IncidentNoise[] {
	const groups = new Map<Arrival | null, NoiseGroup>([[null, emptyGroup()]]);
	const groupOf = (arrivals: readonly Arrival[]) => {
		const owner = scheduled(arrivals);
		const group = groups.get(owner) ?? emptyGroup();
		groups.set(owner, group);
		return group;
	};
	for (const density of densities) addDensity(groupOf(density.arrivals), density, view);
	for (const { line, skirts, arrivals } of lines) {
		const group = groupOf(arrivals);
		const source = arrivals.some(({ waveform }) => waveform) ? movingLineSource : lineSource;
		for (const { noise, powerMw } of skirts)
			addSkirts(group, noise, [source(line.frequencyHz, powerMw, view.rbwHz)]);
	}
	const noises = [...groups].flatMap(([owner, group]) => groupNoise(owner, group, view));
	const narrow = [...groups].flatMap(([owner, group]) =>
		group.narrow.map((density) => narrowNoise(owner, density, view))
	);
	return [...noises, ...narrow];
}

/** The emitter whose schedule the sweep follows; null for what is always on to the filter's eye. */
function scheduled(arrivals: readonly Arrival[]): Arrival | null {
	const owner = pacemaker(arrivals);
	return owner?.timing ? owner : null;
}

function groupNoise(owner: Arrival | null, group: NoiseGroup, view: View): IncidentNoise[] {
	const { rbwHz, leastFloorMw, startHz, spacingHz, floorMw } = view;
	const filtered = (parts: SpectrumPart[]) =>
		new FilteredPower(parts, rbwHz, leastFloorMw, startHz, spacingHz);
	const power = group.parts.length > 0 ? filtered(group.parts) : null;
	const fenced = group.fenced.map(({ part, fromHz, toHz }) => ({ power: filtered([part]), fromHz, toHz }));
	const skirts = [...group.skirted].flatMap(
		([noise, sources]) => SkirtField.of(view.filteredSkirt(noise), sources, leastFloorMw) ?? []
	);
	if (owner && !power && skirts.length + fenced.length === 0) return [];
	const floor = owner ? () => 0 : floorMw;
	return [
		{
			variance(frequencyHz) {
				let sum = floor(frequencyHz);
				if (power) sum += power.at(frequencyHz);
				for (const field of skirts) sum += field.at(frequencyHz);
				for (const { power: outside, fromHz, toHz } of fenced)
					if (frequencyHz < fromHz || frequencyHz > toHz) sum += outside.at(frequencyHz);
				return sum;
			},
			...schedule(owner)
		}
	];
}

/** A density narrower than B/2 fades at its own width; the filter only weighs it. */
function narrowNoise(owner: Arrival | null, carried: CarriedDensity, view: View): IncidentNoise {
	const { rbwHz, leastFloorMw, startHz, spacingHz, receiver } = view;
	const share = densityShare(carried) * (receiver?.lineShare ?? 1);
	const part = spectrumPart(
		carried.density,
		carried.finestHz,
		(frequencyHz) => share * carried.gainAt(frequencyHz)
	);
	const power = new FilteredPower([part], rbwHz, leastFloorMw, startHz, spacingHz);
	return {
		variance: (frequencyHz) => power.at(frequencyHz),
		ownWidthHz: narrowWidthHz(carried.density),
		...schedule(owner)
	};
}

function schedule(owner: Arrival | null): Pick<IncidentNoise, 'timing' | 'centreHz'> {
	if (!owner?.timing) return {};
	return {
		timing: owner.timing,
		...('frequencyHz' in owner.emitter && { centreHz: owner.emitter.frequencyHz })
	};
}
