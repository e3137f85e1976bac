/** A quantity as typed, to a number in the base unit of what is asked for. */
import { type Dimension, dimensionOf, dimensionSpec, toBase } from './dimension';
import { parseNumber } from './parse-number';

export type ParsedQuantity = { ok: true; value: number } | { ok: false; message: string };

const PREFIXES: Record<string, number> = {
	n: 1e-9,
	µ: 1e-6,
	m: 1e-3,
	k: 1e3,
	K: 1e3,
	M: 1e6,
	G: 1e9,
	g: 1e9
};

/**
 * Reads what was typed for a quantity: `-47.2 dBm`, `−47,2`, `1.23 MHz`, `2.4G`, `570 ms`.
 * @param dimension what is asked for
 * @param bareUnit the unit of a number typed without one; absent: the base unit
 * @returns the value in the base unit (Hz, s, dBm at 50 Ω …), or a sentence that says what is wrong
 */
export function parseQuantity(text: string, dimension: Dimension, bareUnit?: string): ParsedQuantity {
	const number = parseNumber(text);
	if (!number.ok) return number;
	const { name, base } = dimensionSpec(dimension);
	const typed = number.rest.replace(/μ/g, 'µ').replace(/\s+/g, ' ');
	if (typed === '') return finish(number.value, bareUnit ?? base);

	const symbol = readSymbol(typed, dimension);
	if (symbol.ok) return finish(number.value * symbol.factor, symbol.unit);
	if (symbol.message) return { ok: false, message: symbol.message };
	const other = knownSymbol(typed);
	const got = other ? `${typed} is a ${dimensionSpec(other).name}` : `there is no unit “${typed}” here`;
	return { ok: false, message: `Expected a ${name} in ${listUnits(dimension)}: ${got}.` };
}

function finish(value: number, unit: string): ParsedQuantity {
	const inBase = toBase(value, unit);
	if (Number.isFinite(inBase)) return { ok: true, value: inBase };
	return { ok: false, message: `A power or voltage must be greater than 0 ${unit} to have a level.` };
}

type ReadSymbol = { ok: true; unit: string; factor: number } | { ok: false; message?: string };

function readSymbol(typed: string, dimension: Dimension): ReadSymbol {
	const { units, base, barePrefix } = dimensionSpec(dimension);
	if (Object.hasOwn(units, typed)) return { ok: true, unit: typed, factor: 1 };
	// Millihertz is nobody's wish on this bench, but the slip of a key that costs a factor of a thousand million.
	if (dimension === 'frequency' && /^m(hz)?$/i.test(typed) && typed.startsWith('m') && typed !== 'mhz') {
		return { ok: false, message: `${typed} means thousandths of a hertz: write MHz or M for megahertz.` };
	}
	if (barePrefix && Object.hasOwn(PREFIXES, typed)) return { ok: true, unit: base, factor: PREFIXES[typed] };
	const alike = Object.keys(units).filter((unit) => sameLetters(unit, typed));
	return alike.length === 1 ? { ok: true, unit: alike[0], factor: 1 } : { ok: false };
}

/** Equal but for capitals, spaces, and u for µ. A capital M is never milli: that would be a factor of 10⁹. */
const sameLetters = (unit: string, typed: string): boolean =>
	!(typed.startsWith('M') && /^m[sWV]/.test(unit)) &&
	unit.replace('µ', 'u').toLowerCase() === typed.replace('µ', 'u').replace(/ /g, '').toLowerCase();

function knownSymbol(typed: string): Dimension | undefined {
	return dimensionOf(typed) ?? dimensionOf(typed.replace('u', 'µ'));
}

function listUnits(dimension: Dimension): string {
	const names = Object.keys(dimensionSpec(dimension).units);
	if (names.length < 2) return names[0] ?? 'no unit at all';
	return `${names.slice(0, -1).join(', ')} or ${names[names.length - 1]}`;
}
