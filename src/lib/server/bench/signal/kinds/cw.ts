import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import { lineOf } from '../comb';
import type { EmitterKind } from '../emitter-kind';
import { integratedPhaseNoise } from '../phase-noise';

/** A carrier. With phase noise, its line keeps exp(−σ²) of the power; the rest is its skirts'. */
export const cw: EmitterKind<EmitterOf<'cw'>> = {
	kind: 'cw',
	behaviour: () => 'lines',
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	lines(emitter, phases, band) {
		const { frequencyHz } = emitter;
		if (band && (frequencyHz < band.startHz || frequencyHz > band.stopHz)) return [];
		const share = emitter.phaseNoise ? Math.exp(-integratedPhaseNoise(emitter.phaseNoise)) : 1;
		return [lineOf(frequencyHz, share * dbmToMilliwatts(emitter.levelDbm), phases.carrierRad)];
	}
};
