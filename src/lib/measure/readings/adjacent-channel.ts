/** Power in neighbouring channels against that in one's own, dBc; the value is the worst of them. */
import { bandPower, type BandPower, channelOf } from '../band';
import { raisedCosineIntegral } from '../raised-cosine';
import type { AdjacentChannel } from '../reading';
import type { RequestOf, Side } from '../reading-request';
import { isNoNumber, noNumber, type NoNumber, type Reader } from '../reader';
import { once, outsideRemark } from '../remarks';
import { positionOf, stepHz, type Trace } from '../trace';

export const adjacentChannel: Reader<'adjacent-channel'> = (trace, request) => {
	const own = channel(trace, request.centreHz, request.widthHz, request.rrcRollOff);
	if (isNoNumber(own)) return own;
	const { neighbours, missing } = readNeighbours(trace, request, own);
	if (neighbours.length === 0) {
		return noNumber('None of the neighbouring channels lies on the trace.', 'a wider span');
	}
	const worst = neighbours.reduce((a, b) => (b.part.dbc > a.part.dbc ? b : a));
	const remarks = [own, ...neighbours.map(({ band }) => band)].flatMap((band) => band.remarks);
	return {
		value: worst.part.dbc,
		unit: 'dBc',
		spread: Math.hypot(own.spreadDb, worst.band.spreadDb),
		remarks: once([...remarks, ...(missing ? [outsideRemark()] : [])]),
		parts: neighbours.map(({ part }) => part)
	};
};

interface Neighbour {
	part: AdjacentChannel;
	band: BandPower;
}

function readNeighbours(
	trace: Trace,
	{ centreHz, offsets, rrcRollOff }: RequestOf<'adjacent-channel'>,
	own: BandPower
): { neighbours: Neighbour[]; missing: boolean } {
	const neighbours: Neighbour[] = [];
	let missing = false;
	for (const { offsetHz, widthHz } of offsets) {
		for (const side of ['lower', 'upper'] as Side[]) {
			const signedHz = side === 'lower' ? -offsetHz : offsetHz;
			const band = channel(trace, centreHz + signedHz, widthHz, rrcRollOff);
			if (isNoNumber(band)) {
				missing = true;
				continue;
			}
			const part = { offsetHz, side, levelDbm: band.levelDbm, dbc: band.levelDbm - own.levelDbm };
			neighbours.push({ part, band });
		}
	}
	return { neighbours, missing };
}

/** Power in a channel; with a roll-off, through a root-raised-cosine filter of symbol rate `widthHz`. */
function channel(trace: Trace, centreHz: number, widthHz: number, rrcRollOff?: number): BandPower | NoNumber {
	if (rrcRollOff === undefined) return bandPower(trace, ...channelOf(centreHz, widthHz));
	const stepsPerSymbolRate = widthHz / stepHz(trace);
	const centre = positionOf(trace, centreHz);
	const integral = (index: number) => raisedCosineIntegral((index - centre) / stepsPerSymbolRate, rrcRollOff);
	return bandPower(
		trace,
		...channelOf(centreHz, widthHz * (1 + rrcRollOff)),
		(index) => (integral(index + 0.5) - integral(index - 0.5)) * stepsPerSymbolRate
	);
}
