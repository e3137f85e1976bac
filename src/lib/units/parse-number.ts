/** Numbers as people type and paste them: −47,2 · 2 412.5 · 1e6 · .5 */

export type ParsedNumber = { ok: true; value: number; rest: string } | { ok: false; message: string };

const refuse = (message: string): ParsedNumber => ({ ok: false, message });
/** Sign, digits with whatever separates them, exponent, rest. */
const PARTS = /^([+-]?)\s*([.,]?\d(?:[\d.,\s'’_]*\d)?[.,]?)(e[+-]?\d+)?\s*(.*)$/isu;
const GAP = /[\s'’_]/gu;
const GROUPED_WHOLE = /^\d{1,3}(?:[\s'’_]\d{3})*$/u;
const GROUPED_DECIMALS = /^(?:\d{3}[\s'’_])*\d{1,3}$/u;

/**
 * Reads the number at the start of `text`. A comma is a decimal sign, unless it could as well separate thousands;
 * digits may stand in groups of three with spaces between.
 * @returns the number and what follows it, trimmed; or a sentence that says what is wrong with it
 */
export function parseNumber(text: string): ParsedNumber {
	const shown = `“${text.trim()}”`;
	const match = PARTS.exec(text.trim().replace(/^[−–‒‐‑]/u, '-'));
	if (!match)
		return refuse(text.trim() === '' ? 'Nothing was typed.' : `${shown} does not start with a number.`);
	const [, sign, digits, exponent = '', rest] = match;
	const [whole, decimals = '', ...more] = digits.split(/[.,]/);
	if (more.length > 0) return refuse(`${shown} has more than one decimal sign: write thousands without one.`);
	if (/^[1-9]\d{0,2},\d{3}$/.test(digits)) {
		return refuse(`${shown} could be ${whole}.${decimals} or ${whole}${decimals}: write one of them.`);
	}
	const oddGaps =
		(/\D/.test(whole) && !GROUPED_WHOLE.test(whole)) ||
		(/\D/.test(decimals) && !GROUPED_DECIMALS.test(decimals));
	if (oddGaps) return refuse(`${shown} holds more than one number.`);
	const value = Number(`${sign}${whole.replace(GAP, '')}.${decimals.replace(GAP, '')}0${exponent}`);
	if (!Number.isFinite(value)) return refuse(`${shown} is too large.`);
	return { ok: true, value: value === 0 ? 0 : value, rest };
}
