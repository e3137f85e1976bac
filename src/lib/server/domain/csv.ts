/** Tables for a spreadsheet. */

/**
 * One cell of text. A spreadsheet takes what begins with = + - @, a tab or a line end for a formula, so such text gets an
 * apostrophe before it; commas, quotes and line ends are quoted (RFC 4180).
 */
export function csvCell(text: string): string {
	const safe = /^[=+\-@\t\r\n]/.test(text) ? `'${text}` : text;
	return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** A number as every spreadsheet reads it, with a point; its own sign makes no formula. */
export const csvNumber = (value: number | null): string =>
	value === null || !Number.isFinite(value) ? '' : String(value);

/** @param rows of cells that have been made by the two above; a byte order mark tells a spreadsheet that this is Unicode */
export const csvFile = (rows: readonly (readonly string[])[]): string =>
	`\uFEFF${rows.map((cells) => cells.join(',')).join('\r\n')}\r\n`;
