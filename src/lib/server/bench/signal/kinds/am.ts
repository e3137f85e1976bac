import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import { lineOf, NEGLIGIBLE } from '../comb';
import type { EmitterKind } from '../emitter-kind';

const power = (emitter: EmitterOf<'am'>) => dbmToMilliwatts(emitter.levelDbm);

/** Amplitude modulation by one tone: the carrier and a sideband of (depth/2)² of its power on either side. */
export const am: EmitterKind<EmitterOf<'am'>> = {
	kind: 'am',
	behaviour: () => 'lines',
	meanPowerMw: (emitter) => power(emitter) * (1 + emitter.depth ** 2 / 2),
	peakPowerMw: (emitter) => power(emitter) * (1 + emitter.depth) ** 2,
	lines(emitter, phases, band) {
		const sidebandMw = (power(emitter) * emitter.depth ** 2) / 4;
		const at = (n: -1 | 0 | 1) =>
			lineOf(
				emitter.frequencyHz + n * emitter.modulatingHz,
				n === 0 ? power(emitter) : sidebandMw,
				phases.carrierRad + n * phases.modulationRad
			);
		const lines = sidebandMw > NEGLIGIBLE * power(emitter) ? [at(-1), at(0), at(1)] : [at(0)];
		return lines.filter((l) => !band || (l.frequencyHz >= band.startHz && l.frequencyHz <= band.stopHz));
	}
};
