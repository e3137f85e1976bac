import { milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import { raisedCosine } from '../signal/raised-cosine';
import { powerBetween, weightedPowerBetween, type Spectrum } from './spectrum';
import type { TruthOf } from './truth-kind';

/** An ideal signal has nothing beside it; a number is still wanted. */
const LEAST_DBC = -200;

/** Power in neighbouring channels over that in one's own; the value is the worst, dBc, −200 at least. */
export const adjacentChannel: TruthOf<'adjacent-channel'> = ({ spectrum }, quantity) => {
	const { centreHz, widthHz, offsets, rrcRollOff } = quantity;
	const ownMw = channel(spectrum(), centreHz, widthHz, rrcRollOff);
	if (!(ownMw > 0))
		throw new BenchError('centreHz', `centreHz: there is no power in the channel at ${centreHz} Hz`);
	const ownDbm = milliwattsToDbm(ownMw);
	const parts = offsets.flatMap((offset) =>
		(['lower', 'upper'] as const).map((side) => {
			const atHz = centreHz + (side === 'lower' ? -offset.offsetHz : offset.offsetHz);
			const share = channel(spectrum(), atHz, offset.widthHz, rrcRollOff) / ownMw;
			const dbc = share > 0 ? Math.max(LEAST_DBC, powerRatioToDb(share)) : LEAST_DBC;
			return { offsetHz: offset.offsetHz, side, levelDbm: ownDbm + dbc, dbc };
		})
	);
	return { value: Math.max(...parts.map(({ dbc }) => dbc)), unit: 'dBc', parts };
};

/** Power in a channel; with a roll-off, behind a root-raised-cosine filter of symbol rate `widthHz`. */
function channel(spectrum: Spectrum, centreHz: number, widthHz: number, rollOff?: number): number {
	if (rollOff === undefined) return powerBetween(spectrum, centreHz - widthHz / 2, centreHz + widthHz / 2);
	const kneeHz = ((1 - rollOff) / 2) * widthHz;
	const edgeHz = ((1 + rollOff) / 2) * widthHz;
	return weightedPowerBetween(
		spectrum,
		centreHz - edgeHz,
		centreHz + edgeHz,
		(frequencyHz) => raisedCosine((frequencyHz - centreHz) / widthHz, rollOff),
		[centreHz - kneeHz, centreHz + kneeHz]
	);
}
