/** Mean power density over a channel: its power over its width. */
import { powerRatioToDb } from '$lib/units/decibel';
import { bandPower, channelOf } from '../band';
import { isNoNumber, type Reader } from '../reader';

export const powerDensity: Reader<'power-density'> = (trace, { centreHz, widthHz }) => {
	const band = bandPower(trace, ...channelOf(centreHz, widthHz));
	if (isNoNumber(band)) return band;
	return {
		value: band.levelDbm - powerRatioToDb(widthHz),
		unit: 'dBm/Hz',
		spread: band.spreadDb,
		remarks: band.remarks
	};
};
