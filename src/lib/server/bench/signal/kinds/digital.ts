import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from '../emitter-kind';
import { raisedCosine, raisedCosineBelow } from '../raised-cosine';
import { waveformKurtosis } from '../waveform-moments';

/** A filter wider than this share of the symbol rate sees the modulation itself. */
const WIDEST_FOR_DENSITY = 0.05;

/** Linear modulation with root-raised-cosine pulses: power density P/R times the raised-cosine spectrum. */
export const digital: EmitterKind<EmitterOf<'digital'>> = {
	kind: 'digital',
	behaviour: (emitter, rbwHz) =>
		rbwHz <= WIDEST_FOR_DENSITY * emitter.symbolRateHz ? 'density' : 'envelope',
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	density({ frequencyHz: centreHz, levelDbm, symbolRateHz, rollOff, order }) {
		const powerMw = dbmToMilliwatts(levelDbm);
		const height = powerMw / symbolRateHz;
		const kneeHz = ((1 - rollOff) / 2) * symbolRateHz;
		const edgeHz = ((1 + rollOff) / 2) * symbolRateHz;
		return {
			powerMw,
			startHz: centreHz - edgeHz,
			stopHz: centreHz + edgeHz,
			cumulative: (frequencyHz) => raisedCosineBelow((frequencyHz - centreHz) / symbolRateHz, rollOff),
			densityMwPerHz: (frequencyHz) =>
				height * raisedCosine((frequencyHz - centreHz) / symbolRateHz, rollOff),
			kurtosis: waveformKurtosis(order, rollOff),
			regrowth: { order, rollOff, symbolRateHz },
			breaksHz: [-edgeHz, -kneeHz, kneeHz, edgeHz].map((offsetHz) => centreHz + offsetHz),
			shapeKey: `digital ${centreHz} ${symbolRateHz} ${rollOff} ${order}`
		};
	}
};
