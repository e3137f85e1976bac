/** Signals that the filter is wide enough to follow: made as waveforms by the sweep. */
import type { IncidentEnvelope } from '../incident';
import type { Seed } from '../random';
import { emitterPhases } from './arrival';
import type { Carried, CarriedDensity } from './carried';
import { movingLine } from './moving-line';
import type { PhaseNoise } from './skirt-shape';

export const incidentEnvelopes = (
	{ lines, densities }: Carried,
	receiver: PhaseNoise | null,
	seed: Seed
): IncidentEnvelope[] => [
	...densities.flatMap((carried) => modulated(carried, receiver, seed) ?? []),
	...lines.flatMap((carried) => movingLine(carried, receiver) ?? [])
];

/** A digitally modulated waveform: its density only entered the stages to find its gain. */
function modulated(
	{ own, density, gainAt }: CarriedDensity,
	receiver: PhaseNoise | null,
	seed: Seed
): IncidentEnvelope | null {
	const emitter = own?.waveform;
	if (!own || !emitter) return null;
	const { frequencyHz } = emitter;
	const amplitude = Math.sqrt(density.powerMw * gainAt(frequencyHz) * (receiver?.lineShare ?? 1));
	const { carrierRad } = emitterPhases(seed, own.index);
	return {
		emitter,
		index: own.index,
		frequencyHz,
		re: amplitude * Math.cos(carrierRad),
		im: amplitude * Math.sin(carrierRad),
		...(own.timing && { timing: own.timing })
	};
}
