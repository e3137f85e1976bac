import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from '../emitter-kind';

const power = (emitter: EmitterOf<'noise'>) =>
	dbmToMilliwatts(emitter.densityDbmPerHz) * (emitter.stopHz - emitter.startHz);

/** Gaussian noise, flat between two frequencies. */
export const noise: EmitterKind<EmitterOf<'noise'>> = {
	kind: 'noise',
	behaviour: () => 'density',
	meanPowerMw: power,
	peakPowerMw: power,
	density({ startHz, stopHz, densityDbmPerHz }) {
		const height = dbmToMilliwatts(densityDbmPerHz);
		const widthHz = stopHz - startHz;
		return {
			powerMw: height * widthHz,
			startHz,
			stopHz,
			cumulative: (frequencyHz) => Math.min(1, Math.max(0, (frequencyHz - startHz) / widthHz)),
			densityMwPerHz: (frequencyHz) => (frequencyHz >= startHz && frequencyHz <= stopHz ? height : 0),
			kurtosis: 2,
			breaksHz: [startHz, stopHz],
			shapeKey: `noise ${startHz} ${stopHz}`
		};
	}
};
