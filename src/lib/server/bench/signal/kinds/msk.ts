import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from '../emitter-kind';
import { mskSpectrum } from '../msk-spectrum';

/** A filter wider than this share of the bit rate sees the modulation itself. */
const WIDEST_FOR_DENSITY = 0.02;

/** Minimum-shift keying, with `bt` through a Gaussian filter first: constant envelope. */
export const msk: EmitterKind<EmitterOf<'msk'>> = {
	kind: 'msk',
	behaviour: (emitter, rbwHz) => (rbwHz <= WIDEST_FOR_DENSITY * emitter.bitRateHz ? 'density' : 'envelope'),
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	density({ frequencyHz: centreHz, levelDbm, bitRateHz, bt }) {
		const powerMw = dbmToMilliwatts(levelDbm);
		const spectrum = mskSpectrum(bt);
		const at = (frequencyHz: number) => (frequencyHz - centreHz) / bitRateHz;
		const reachHz = spectrum.reachPerBit * bitRateHz;
		return {
			powerMw,
			startHz: centreHz - reachHz,
			stopHz: centreHz + reachHz,
			cumulative: (frequencyHz) => spectrum.below(at(frequencyHz)),
			densityMwPerHz: (frequencyHz) => (powerMw / bitRateHz) * spectrum.density(at(frequencyHz)),
			kurtosis: 1,
			regrowth: 'none',
			breaksHz: [-reachHz, -bitRateHz, 0, bitRateHz, reachHz].map((offsetHz) => centreHz + offsetHz),
			shapeKey: `msk ${centreHz} ${bitRateHz} ${bt ?? 'flat'}`
		};
	}
};
