import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { csvCell, csvFile, csvNumber } from '$lib/server/domain/csv';

describe('csvCell(text)', () => {
	it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\t=1', '\r=1', '\n=1'])('makes no formula of %j', (text) => {
		expect(csvCell(text)).toMatch(/^"?'/);
	});

	it('quotes commas, quotes and line ends, and nothing else', () => {
		expect(csvCell('a, "b"\nc')).toBe('"a, ""b""\nc"');
		expect(csvCell('channel power −20.5 dBm')).toBe('channel power −20.5 dBm');
	});

	it('never begins with what a spreadsheet takes for a formula', () => {
		fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => !/^"?[=+\-@\t\r\n]/.test(csvCell(text))));
	});
});

describe('csvFile(rows)', () => {
	it('begins with a byte order mark and ends each line as spreadsheets want it', () => {
		expect(
			csvFile([
				['a', 'b'],
				[csvNumber(-20.5), csvNumber(null)]
			])
		).toBe('\uFEFFa,b\r\n-20.5,\r\n');
	});
});
