/** The unit that levels are shown in, chosen once: figures, spreads, level lines. Levels themselves stay in dBm. */
import type { AntennaTable, LevelUnit } from '$lib/schemas/markings';
import { formatFigure, type Shown } from '$lib/units/format-quantity';
import { fieldStrengthDbMicrovoltsPerM } from '$lib/units/field-strength';
import { dbmToDbMicrovolts, dbmToDbMillivolts, dbmToVolts, dbmToWatts } from '$lib/units/level';

export interface LevelScale {
	unit: LevelUnit;
	/** What turns a level into a field strength; without it dBµV/m shows dBµV. */
	antenna: AntennaTable | null;
}
export const inDbm: LevelScale = { unit: 'dBm', antenna: null };

const prefixes = [
	['', 1],
	['m', 1e-3],
	['µ', 1e-6],
	['n', 1e-9],
	['p', 1e-12]
] as const;
/** Prefixes that people may type too: nobody reads nanovolts here. */
const ofVolts = prefixes.slice(0, 3);

/** A table over frequency, linear between its points and flat outside. */
export function tableDb(table: readonly { frequencyHz: number; db: number }[], atHz: number): number {
	const after = table.findIndex(({ frequencyHz }) => frequencyHz >= atHz);
	if (after === 0) return table[0].db;
	if (after < 0) return table[table.length - 1].db;
	const [low, high] = [table[after - 1], table[after]];
	const share = (atHz - low.frequencyHz) / (high.frequencyHz - low.frequencyHz);
	return low.db + share * (high.db - low.db);
}

/** The antenna's factor at a frequency, dB/m; 0 where levels are no field strengths. */
export const antennaDb = ({ unit, antenna }: LevelScale, atHz: number): number =>
	unit === 'dBµV/m' && antenna
		? tableDb(
				antenna.map(({ frequencyHz, dbPerM }) => ({ frequencyHz, db: dbPerM })),
				atHz
			)
		: 0;

/** @param atHz where the level stands: an antenna's factor depends on it */
export function showLevel(levelDbm: number, scale: LevelScale, atHz: number, digits = 1): Shown {
	const decibels = (value: number, unit: string) => ({ figure: formatFigure(value, digits), unit });
	switch (scale.unit) {
		case 'dBm':
			return decibels(levelDbm, 'dBm');
		case 'dBµV':
			return decibels(dbmToDbMicrovolts(levelDbm), 'dBµV');
		case 'dBmV':
			return decibels(dbmToDbMillivolts(levelDbm), 'dBmV');
		case 'V':
			return linear(dbmToVolts(levelDbm), 'V', ofVolts);
		case 'W':
			return linear(dbmToWatts(levelDbm), 'W', prefixes);
		case 'dBµV/m':
			return scale.antenna
				? decibels(fieldStrengthDbMicrovoltsPerM(levelDbm, antennaDb(scale, atHz)), 'dBµV/m')
				: decibels(dbmToDbMicrovolts(levelDbm), 'dBµV');
	}
}

/** Three figures that count, under the prefix that leaves a whole digit. */
function linear(value: number, unit: string, among: readonly (readonly [string, number])[]): Shown {
	const [prefix, size] = among.find(([, least]) => value >= least * 0.9995) ?? among[among.length - 1];
	const scaled = Number((value / size).toPrecision(3));
	const digits = Math.max(0, Math.min(6, 2 - Math.floor(Math.log10(scaled) + 1e-9)));
	return { figure: formatFigure(scaled, digits), unit: prefix + unit };
}

/** One standard deviation of a level in the figure's own unit: dB for decibels, volts or watts by the slope at the level. */
export function levelSpread(
	spreadDb: number,
	levelDbm: number,
	scale: LevelScale,
	digits: (of: number) => number
) {
	if (scale.unit !== 'V' && scale.unit !== 'W') return formatFigure(spreadDb, digits(spreadDb));
	const { figure } = showLevel(levelDbm, scale, 0);
	const shown = Number(figure.replace('−', '-'));
	const spread = shown * (Math.LN10 / (scale.unit === 'V' ? 20 : 10)) * spreadDb;
	const decimals = (figure.split('.')[1] ?? '').length;
	return formatFigure(spread, Math.max(decimals, digits(spread)));
}

/** A level of the set-up: it stands at the connector, so that a field strength is the voltage it arrives as. */
export const atConnector = (levelDbm: number, { unit }: LevelScale): Shown =>
	showLevel(levelDbm, { unit: unit === 'dBµV/m' ? 'dBµV' : unit, antenna: null }, 0);
