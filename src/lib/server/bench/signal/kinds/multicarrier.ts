import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from '../emitter-kind';
import { sincSquaredSum, sincSquaredSumBelow } from '../sinc-squared';

/** Density at the end of the support, over that at the top. */
const SUPPORT_END = 1e-10;

/** Subcarriers at whole spacings from the centre, none on it; an odd one goes above. */
function runs(subcarriers: number): [number, number][] {
	const below = Math.floor(subcarriers / 2);
	return [
		[-below, -1],
		[1, subcarriers - below]
	];
}

/** Many subcarriers with rectangular pulses, no guard: a sum of sinc². */
export const multicarrier: EmitterKind<EmitterOf<'multicarrier'>> = {
	kind: 'multicarrier',
	behaviour: () => 'density',
	meanPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	peakPowerMw: (emitter) => dbmToMilliwatts(emitter.levelDbm),
	density({ frequencyHz: centreHz, levelDbm, subcarriers, spacingHz }) {
		const powerMw = dbmToMilliwatts(levelDbm);
		const height = powerMw / (subcarriers * spacingHz);
		const carriers = runs(subcarriers);
		const sum = (of: (first: number, last: number, x: number) => number, frequencyHz: number) => {
			const x = (frequencyHz - centreHz) / spacingHz;
			return carriers.reduce((total, [first, last]) => total + of(first, last, x), 0);
		};
		// Far out, every subcarrier adds 1/(2π²x²) on average.
		const reachHz = spacingHz * (subcarriers / 2 + Math.sqrt(subcarriers / (2 * SUPPORT_END)) / Math.PI);
		const blockHz = spacingHz * (Math.ceil(subcarriers / 2) + 1);
		return {
			powerMw,
			startHz: centreHz - reachHz,
			stopHz: centreHz + reachHz,
			cumulative: (frequencyHz) => sum(sincSquaredSumBelow, frequencyHz) / subcarriers,
			densityMwPerHz: (frequencyHz) => height * sum(sincSquaredSum, frequencyHz),
			kurtosis: 2,
			breaksHz: [centreHz - reachHz, centreHz - blockHz, centreHz, centreHz + blockHz, centreHz + reachHz],
			shapeKey: `multicarrier ${centreHz} ${subcarriers} ${spacingHz}`
		};
	}
};
