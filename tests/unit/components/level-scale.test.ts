import { describe, expect, it } from 'vitest';
import { axisUnit, levelLines } from '$lib/components/bench/levels/level-lines';
import {
	antennaDb,
	inDbm,
	levelSpread,
	showLevel,
	tableDb,
	type LevelScale
} from '$lib/components/bench/levels/level-scale';
import { spreadDigits } from '$lib/components/bench/shown-quantity';
import type { LevelUnit } from '$lib/schemas/markings';

const scale = (unit: LevelUnit): LevelScale => ({ unit, antenna: null });
const antenna = [
	{ frequencyHz: 400e6, dbPerM: 17 },
	{ frequencyHz: 500e6, dbPerM: 19 }
];
const field: LevelScale = { unit: 'dBµV/m', antenna };
const figures = (unit: LevelUnit, referenceDbm = 0) =>
	levelLines(referenceDbm, referenceDbm + 6, referenceDbm - 110, scale(unit)).map(({ figure }) => figure);

describe('showLevel(levelDbm, scale, atHz)', () => {
	// 0 dBm across 50 Ω is 107.0 dBµV, 47.0 dBmV, 224 mV and 1 mW: common knowledge of the trade.
	it.each([
		['dBm', '0.0', 'dBm'],
		['dBµV', '107.0', 'dBµV'],
		['dBmV', '47.0', 'dBmV'],
		['V', '224', 'mV'],
		['W', '1.00', 'mW']
	] as const)('writes 0 dBm in %s as %s %s', (unit, figure, shownUnit) => {
		expect(showLevel(0, scale(unit), 450e6)).toEqual({ figure, unit: shownUnit });
	});
	it('keeps three figures that count, whatever the prefix', () => {
		expect(showLevel(-47.2, scale('W'), 0)).toEqual({ figure: '19.1', unit: 'nW' });
		expect(showLevel(-47.2, scale('V'), 0)).toEqual({ figure: '976', unit: 'µV' });
		expect(showLevel(29.9999, scale('W'), 0)).toEqual({ figure: '1.00', unit: 'W' });
	});
	it('adds the antenna’s factor at the place of the level, and without a table shows what arrives', () => {
		expect(showLevel(-60, field, 450e6)).toEqual({ figure: '65.0', unit: 'dBµV/m' });
		expect(showLevel(-60, scale('dBµV/m'), 450e6)).toEqual({ figure: '47.0', unit: 'dBµV' });
	});
});

describe('tables over frequency', () => {
	const table = [
		{ frequencyHz: 100e6, db: 1 },
		{ frequencyHz: 300e6, db: 2 }
	];
	it('are linear between their points and flat outside', () => {
		expect([50e6, 100e6, 200e6, 300e6, 900e6].map((hz) => tableDb(table, hz))).toEqual([1, 1, 1.5, 2, 2]);
	});
	it('lift a level by the antenna only where it is shown as a field', () => {
		expect(antennaDb(field, 425e6)).toBeCloseTo(17.5, 9);
		expect(antennaDb({ unit: 'dBµV', antenna }, 425e6)).toBe(0);
	});
});

describe('levelSpread(spreadDb, levelDbm, scale)', () => {
	it('is the slope at the level where the unit is linear', () => {
		// 0.1 dB of 224 mV is 224·ln(10)/20·0.1 = 2.58 mV.
		expect(levelSpread(0.1, 0, scale('V'), spreadDigits)).toBe('2.6');
		expect(levelSpread(0.1, 0, inDbm, spreadDigits)).toBe('0.1');
	});
});

describe('levelLines(referenceDbm, topDbm, bottomDbm, scale)', () => {
	it('stand on figures that are round in the unit', () => {
		expect(figures('dBµV')).toEqual(['100', '80', '60', '40', '20', '0']);
		expect(figures('V')).toEqual(['100 mV', '10 mV', '1 mV', '100 µV', '10 µV', '1 µV']);
		expect(figures('W')).toEqual(['100 µW', '1 µW', '10 nW', '100 pW', '1 pW']);
	});
	it('lie where the level has that figure', () => {
		for (const unit of ['dBµV', 'dBmV'] as const) {
			for (const { levelDbm, figure } of levelLines(-20, -14, -130, scale(unit))) {
				expect(showLevel(levelDbm, scale(unit), 0, 0).figure).toBe(figure);
			}
		}
	});
	it('bear their unit themselves where it changes from line to line', () => {
		expect((['dBm', 'V', 'W'] as const).map((unit) => axisUnit(scale(unit)))).toEqual(['dBm', '', '']);
		expect([axisUnit(field), axisUnit(scale('dBµV/m'))]).toEqual(['dBµV/m', 'dBµV']);
	});
});
