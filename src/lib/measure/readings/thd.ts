/** Total harmonic distortion: root of the harmonics' summed power over the fundamental's, %. */
import { dbToPowerRatio } from '$lib/units/decibel';
import { readHarmonics } from '../harmonic-lines';
import { isNoNumber, type Reader } from '../reader';

export const thd: Reader<'thd'> = (trace, { fundamentalHz, count }) => {
	const found = readHarmonics(trace, fundamentalHz, count);
	if (isNoNumber(found)) return found;
	const shares = found.harmonics.map(({ dbc }) => dbToPowerRatio(dbc));
	const sum = shares.reduce((a, b) => a + b, 0);
	const value = 100 * Math.sqrt(sum);
	// d(√Σ) = Σ share·δdB/(2·√Σ)·ln 10/10: each harmonic strays by itself, the fundamental moves them all.
	const strayDb = Math.hypot(...found.harmonics.map(({ spreadDb }, i) => (shares[i] / sum) * spreadDb));
	return {
		value,
		unit: '%',
		spread: value * (Math.LN10 / 20) * Math.hypot(strayDb, found.fundamentalSpreadDb),
		remarks: found.remarks,
		parts: found.harmonics.map(({ n, frequencyHz, levelDbm, dbc }) => ({ n, frequencyHz, levelDbm, dbc }))
	};
};
