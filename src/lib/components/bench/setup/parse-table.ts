/** A table over frequency as people type or paste it: a row a line, frequency first, then decibels. */
import { parseNumber } from '$lib/units/parse-number';
import { parseQuantity } from '$lib/units/parse-quantity';

export interface TablePoint {
	frequencyHz: number;
	db: number;
}
export type ParsedTable = { ok: true; points: TablePoint[] } | { ok: false; message: string };

/** The unit of a frequency typed without one. */
export const bareFrequency = 'MHz';
const row = /^(.+?)(?:\s*[\t;]\s*|,\s+|\s+|,)([+\-−–]?\s*\d[\d.,]*)\s*(dB(?:\/m)?)?$/u;

/**
 * Reads “450 MHz, 4.9”, “450 4.9 dB” or what a spreadsheet copies, one row a line, in any order; a first line without
 * figures is a heading.
 * @returns the points, rising, or a sentence that names the line that doesn't read
 */
export function parseTable(text: string): ParsedTable {
	const points: TablePoint[] = [];
	for (const [i, line] of text.split(/\r?\n/).entries()) {
		const typed = line.trim();
		if (typed === '' || (i === 0 && !/\d/.test(typed))) continue;
		const point = parseRow(typed);
		if (typeof point === 'string') return { ok: false, message: `Line ${i + 1}: ${point}` };
		points.push(point);
	}
	if (points.length === 0) return { ok: false, message: 'Type a row: a frequency, then its decibels.' };
	points.sort((a, b) => a.frequencyHz - b.frequencyHz);
	const twice = points.find((point, i) => i > 0 && point.frequencyHz === points[i - 1].frequencyHz);
	if (twice) return { ok: false, message: `${twice.frequencyHz / 1e6} MHz stands there twice.` };
	return { ok: true, points };
}

function parseRow(typed: string): TablePoint | string {
	const match = row.exec(typed);
	if (!match) return `“${typed}” is not a frequency and its decibels.`;
	const frequency = parseQuantity(match[1], 'frequency', bareFrequency);
	if (!frequency.ok) return frequency.message;
	const db = parseNumber(match[2]);
	if (!db.ok) return db.message;
	if (!(frequency.value > 0)) return 'a frequency is greater than 0.';
	return { frequencyHz: frequency.value, db: db.value };
}

/** A table as `parseTable` reads it again. */
export const writeTable = (points: readonly TablePoint[]): string =>
	points.map(({ frequencyHz, db }) => `${frequencyHz / 1e6} MHz, ${db}`).join('\n');
