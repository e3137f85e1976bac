/** Noise density at a marker. */
import { noiseDensityAt } from '../noise-density';
import { isNoNumber, type Reader } from '../reader';

export const noiseDensity: Reader<'noise-density'> = (trace, { atHz }) => {
	const density = noiseDensityAt(trace, atHz);
	if (isNoNumber(density)) return density;
	return { value: density.dbmPerHz, unit: 'dBm/Hz', spread: density.spreadDb, remarks: density.remarks };
};
