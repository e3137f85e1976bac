import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseTable, writeTable } from '$lib/components/bench/setup/parse-table';

const two = [
	{ frequencyHz: 430e6, db: 4.7 },
	{ frequencyHz: 470e6, db: 5.1 }
];

describe('parseTable(text)', () => {
	it.each([
		['units and a comma', '430 MHz, 4.7\n470 MHz, 5.1'],
		['bare figures in MHz', '430 4.7\n470 5.1'],
		['what a spreadsheet copies, with a heading', 'Frequency\tLoss\n430\t4.7\n470\t5.1\n'],
		['decimal commas between semicolons', '430;4,7\r\n470;5,1'],
		['rows in any order, with dB', '0.47 GHz  5.1 dB\n430MHz 4.7dB']
	])('reads %s', (_, text) => {
		expect(parseTable(text)).toEqual({ ok: true, points: two });
	});
	it('takes a true minus', () => {
		expect(parseTable('430, −0.5')).toEqual({ ok: true, points: [{ frequencyHz: 430e6, db: -0.5 }] });
	});
	it.each([
		['430 4.7\nfour', 'Line 2: “four” is not a frequency and its decibels.'],
		['430 dBm, 4.7', 'Line 1: Expected a frequency in Hz, kHz, MHz or GHz: dBm is a level.'],
		['430 4.7\n430 4.8', '430 MHz stands there twice.'],
		['', 'Type a row: a frequency, then its decibels.']
	])('refuses %j in a sentence', (text, message) => {
		expect(parseTable(text)).toEqual({ ok: false, message });
	});
	it('reads what writeTable writes', () => {
		const point = fc.record({
			frequencyHz: fc.integer({ min: 1, max: 8200 }).map((mhz) => mhz * 1e6),
			db: fc.integer({ min: -900, max: 900 }).map((tenths) => tenths / 10)
		});
		const tables = fc.uniqueArray(point, { minLength: 1, selector: ({ frequencyHz }) => frequencyHz });
		fc.assert(
			fc.property(tables, (table) => {
				const points = [...table].sort((a, b) => a.frequencyHz - b.frequencyHz);
				expect(parseTable(writeTable(points))).toEqual({ ok: true, points });
			})
		);
	});
});
