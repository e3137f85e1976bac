import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import { angleBehaviour, angleLines } from '../angle-modulation';
import type { EmitterKind } from '../emitter-kind';

/** Phase modulation by one tone, peak deviation given: constant envelope, Bessel lines. */
export const pm: EmitterKind<EmitterOf<'pm'>> = {
	kind: 'pm',
	behaviour: (emitter, rbwHz) => angleBehaviour(emitter.modulatingHz, emitter.deviationRad, rbwHz),
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	lines: (emitter, phases, band) =>
		angleLines(
			{
				frequencyHz: emitter.frequencyHz,
				powerMw: dbmToMilliwatts(emitter.levelDbm),
				modulatingHz: emitter.modulatingHz,
				indexRad: emitter.deviationRad,
				carrierRad: phases.carrierRad,
				// cos θ = sin(θ + π/2)
				toneRad: phases.modulationRad + Math.PI / 2
			},
			band
		)
};
