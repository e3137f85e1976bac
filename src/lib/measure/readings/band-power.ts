/** Power between two frequencies. */
import { bandPower as integrate } from '../band';
import { isNoNumber, type Reader } from '../reader';

export const bandPower: Reader<'band-power'> = (trace, { startHz, stopHz }) => {
	const band = integrate(trace, startHz, stopHz);
	if (isNoNumber(band)) return band;
	return { value: band.levelDbm, unit: 'dBm', spread: band.spreadDb, remarks: band.remarks };
};
