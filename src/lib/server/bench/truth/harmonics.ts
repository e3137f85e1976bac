import { milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import { lineAt, type Spectrum } from './spectrum';
import type { TruthOf } from './truth-kind';

/** Where a harmonic is missing a number is still wanted. */
const LEAST_DBC = -200;

/** Harmonics n = 2 … count + 1 of the line at `fundamentalHz`. */
function harmonicsOf(spectrum: Spectrum, fundamentalHz: number, count: number) {
	const fundamental = lineAt(spectrum, fundamentalHz);
	if (!fundamental)
		throw new BenchError('fundamentalHz', `fundamentalHz: there is no line at ${fundamentalHz} Hz`);
	const fundamentalDbm = milliwattsToDbm(fundamental.levelMw);
	return Array.from({ length: count }, (_, i) => {
		const frequencyHz = (i + 2) * fundamental.frequencyHz;
		const share = (lineAt(spectrum, frequencyHz)?.levelMw ?? 0) / fundamental.levelMw;
		const dbc = share > 0 ? Math.max(LEAST_DBC, powerRatioToDb(share)) : LEAST_DBC;
		return { n: i + 2, frequencyHz, levelDbm: fundamentalDbm + dbc, dbc };
	});
}

/** The strongest harmonic against the fundamental, dBc. */
export const harmonics: TruthOf<'harmonics'> = ({ spectrum }, { fundamentalHz, count }) => {
	const parts = harmonicsOf(spectrum(), fundamentalHz, count);
	return { value: Math.max(...parts.map(({ dbc }) => dbc)), unit: 'dBc', parts };
};

/** Root of the harmonics' summed power over the fundamental's, %. */
export const thd: TruthOf<'thd'> = ({ spectrum }, { fundamentalHz, count }) => {
	const parts = harmonicsOf(spectrum(), fundamentalHz, count);
	const sum = parts.reduce((total, { dbc }) => total + 10 ** (dbc / 10), 0);
	return { value: 100 * Math.sqrt(sum), unit: '%', parts };
};
