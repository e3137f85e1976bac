/** The level lines of a plot, one every 20 dB, and the unit over them. */
import { formatFigure } from '$lib/units/format-quantity';
import { dbmToDbMicrovolts, dbmToDbMillivolts, dbmToVolts } from '$lib/units/level';
import { inDbm, showLevel, type LevelScale } from './level-scale';

/** Level lines between two levels, on figures that are round in the unit: for dBm counted from the reference. */
export function levelLines(
	referenceDbm: number,
	topDbm: number,
	bottomDbm: number,
	scale: LevelScale = inDbm,
	stepDb = 20
): { levelDbm: number; figure: string }[] {
	const round = firstRound(referenceDbm, topDbm, scale, stepDb);
	const decimals = Number.isInteger(round.figure) ? 0 : 1;
	const lines = [];
	for (let n = 0; round.levelDbm - n * stepDb > bottomDbm + 2; n++) {
		const levelDbm = round.levelDbm - n * stepDb;
		const figure =
			scale.unit === 'V' || scale.unit === 'W'
				? shortLinear(levelDbm, scale)
				: formatFigure(round.figure - n * stepDb, decimals);
		lines.push({ levelDbm, figure });
	}
	return lines;
}

function firstRound(referenceDbm: number, topDbm: number, scale: LevelScale, stepDb: number) {
	if (scale.unit === 'dBm') {
		const above = Math.floor((topDbm - referenceDbm) / stepDb) * stepDb;
		return { levelDbm: referenceDbm + above, figure: referenceDbm + above };
	}
	// A round figure is a whole step over 1 V, 1 W, 0 dBµV or 0 dBmV; a field is lifted by its antenna before it comes here.
	const zeroDbm = zerosDbm[scale.unit];
	const figure = Math.floor((topDbm - zeroDbm) / stepDb) * stepDb;
	return { levelDbm: zeroDbm + figure, figure };
}
const zerosDbm = {
	dBµV: -dbmToDbMicrovolts(0),
	'dBµV/m': -dbmToDbMicrovolts(0),
	dBmV: -dbmToDbMillivolts(0),
	/** 1 V across 50 Ω; voltage falls by ten every 20 dB. */
	V: -20 * Math.log10(dbmToVolts(0)),
	W: 30
};

function shortLinear(levelDbm: number, scale: LevelScale): string {
	const { figure, unit } = showLevel(levelDbm, scale, 0);
	return `${Number(figure)} ${unit}`;
}

/** What stands over the level axis: nothing where every line bears its own unit. */
export const axisUnit = ({ unit, antenna }: LevelScale): string =>
	unit === 'V' || unit === 'W' ? '' : unit === 'dBµV/m' && !antenna ? 'dBµV' : unit;
