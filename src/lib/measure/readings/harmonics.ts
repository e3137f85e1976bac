/** Harmonics of a carrier against it, dBc; the value is the strongest. */
import { readHarmonics } from '../harmonic-lines';
import { isNoNumber, type Reader } from '../reader';

export const harmonics: Reader<'harmonics'> = (trace, { fundamentalHz, count }) => {
	const found = readHarmonics(trace, fundamentalHz, count);
	if (isNoNumber(found)) return found;
	const strongest = found.harmonics.reduce((a, b) => (b.dbc > a.dbc ? b : a));
	return {
		value: strongest.dbc,
		unit: 'dBc',
		spread: Math.hypot(found.fundamentalSpreadDb, strongest.spreadDb),
		remarks: found.remarks,
		parts: found.harmonics.map(({ n, frequencyHz, levelDbm, dbc }) => ({ n, frequencyHz, levelDbm, dbc }))
	};
};
