/** Power in a channel. */
import { bandPower, channelOf } from '../band';
import { isNoNumber, type Reader } from '../reader';

export const channelPower: Reader<'channel-power'> = (trace, { centreHz, widthHz }) => {
	const band = bandPower(trace, ...channelOf(centreHz, widthHz));
	if (isNoNumber(band)) return band;
	return { value: band.levelDbm, unit: 'dBm', spread: band.spreadDb, remarks: band.remarks };
};
