import { describe, expect, it } from 'vitest';
import {
	clockParts,
	frequencyColumn,
	frequencyFigure,
	shownReading,
	shownSetting,
	shownSpread
} from '$lib/components/bench/shown-quantity';

describe('frequencies in a column', () => {
	const column = frequencyColumn(450.075e6, 100);
	it('stand in one unit, decimals in threes down to one point of the trace', () => {
		expect(column).toEqual({ unit: 'MHz', decimals: 6 });
		expect(frequencyFigure(450.0225e6, column)).toBe('450.022\u202f500');
	});
	it('carry a sign when they are differences', () => {
		expect(frequencyFigure(33e3, column, true)).toBe('+0.033\u202f000');
		expect(frequencyFigure(-33e3, column, true)).toBe('−0.033\u202f000');
	});
});

describe('values', () => {
	it('have one decimal when they are levels', () =>
		expect(shownReading(-11.74, 'dBm')).toEqual({ figure: '−11.7', unit: 'dBm' }));
	it('of a count go down to a digit of its spread', () =>
		expect(shownReading(450_012_345.678, 'Hz', 0.02)).toEqual({
			figure: '450.012\u202f345\u202f68',
			unit: 'MHz'
		}));
	it('come in the unit that suits them when they are widths', () =>
		expect(shownReading(17400, 'Hz').unit).toBe('kHz'));
	it('show a spread to a digit that says something', () => {
		expect(shownSpread(0.24, -11.7, 'dBm')).toBe('±0.2');
		expect(shownSpread(0.083, -11.7, 'dBm')).toBe('±0.08');
		expect(shownSpread(0, -11.7, 'dBm')).toBe('');
		expect(shownSpread(120, 17400, 'Hz')).toBe('±0.1');
	});
	it('are short when they are settings', () => {
		expect(shownSetting(450.025e6, 'Hz')).toEqual({ figure: '450.025', unit: 'MHz' });
		expect(shownSetting(0.5700001, 's')).toEqual({ figure: '570', unit: 'ms' });
		expect(shownSetting(10, 'dB').figure).toBe('10');
	});
	it('tell receiver time in minutes and seconds', () =>
		expect(clockParts(372.4)).toEqual({ minutes: 6, seconds: 12 }));
});
