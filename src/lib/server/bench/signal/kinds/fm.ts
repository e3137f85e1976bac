import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import { angleBehaviour, angleLines } from '../angle-modulation';
import type { EmitterKind } from '../emitter-kind';

const indexRad = (emitter: EmitterOf<'fm'>) => emitter.deviationHz / emitter.modulatingHz;

/** Frequency modulation by one tone, peak deviation given: constant envelope, Bessel lines. */
export const fm: EmitterKind<EmitterOf<'fm'>> = {
	kind: 'fm',
	behaviour: (emitter, rbwHz) => angleBehaviour(emitter.modulatingHz, indexRad(emitter), rbwHz),
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	lines: (emitter, phases, band) =>
		angleLines(
			{
				frequencyHz: emitter.frequencyHz,
				powerMw: dbmToMilliwatts(emitter.levelDbm),
				modulatingHz: emitter.modulatingHz,
				indexRad: indexRad(emitter),
				carrierRad: phases.carrierRad,
				toneRad: phases.modulationRad
			},
			band
		)
};
