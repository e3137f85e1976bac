import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import { combOfSwitchedLine, lineOf } from '../comb';
import type { EmitterKind } from '../emitter-kind';

/** A carrier switched on for `widthS` every `periodS`: lines while the filter can tell them apart, else pulses. */
export const pulsed: EmitterKind<EmitterOf<'pulsed'>> = {
	kind: 'pulsed',
	behaviour: (emitter, rbwHz) => (1 / emitter.periodS >= rbwHz / 2 ? 'lines' : 'pulses'),
	meanPowerMw: (emitter) => (dbmToMilliwatts(emitter.levelDbm) * emitter.widthS) / emitter.periodS,
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	lines: (emitter, phases, band) =>
		combOfSwitchedLine(
			lineOf(emitter.frequencyHz, dbmToMilliwatts(emitter.levelDbm), phases.carrierRad),
			{
				onS: emitter.widthS,
				periodS: emitter.periodS,
				startS: (-phases.modulationRad / (2 * Math.PI)) * emitter.periodS - emitter.widthS / 2
			},
			band
		)
};
