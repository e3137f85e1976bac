/** What people type after a number, by dimension. A dimension's base unit is the one values are kept in. */
import { dbMicrovoltsToDbm, dbMillivoltsToDbm, voltsToDbm, wattsToDbm } from './level';

/** A linear unit is a factor of the base unit; others say how to get there. */
type ToBase = number | ((value: number) => number);
interface DimensionSpec {
	/** As in "Expected a …". */
	name: string;
	base: string;
	units: Record<string, ToBase>;
	/** Whether a bare SI prefix will do: 2.4G, 100k. */
	barePrefix?: boolean;
}

export const dimensions = {
	frequency: {
		name: 'frequency',
		base: 'Hz',
		units: { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 },
		barePrefix: true
	},
	time: {
		name: 'time',
		base: 's',
		units: { s: 1, ms: 1e-3, µs: 1e-6, ns: 1e-9, min: 60 },
		barePrefix: true
	},
	level: {
		name: 'level',
		base: 'dBm',
		units: {
			dBm: 1,
			dBµV: dbMicrovoltsToDbm,
			dBmV: dbMillivoltsToDbm,
			W: wattsToDbm,
			mW: (milliwatts) => wattsToDbm(milliwatts * 1e-3),
			µW: (microwatts) => wattsToDbm(microwatts * 1e-6),
			nW: (nanowatts) => wattsToDbm(nanowatts * 1e-9),
			pW: (picowatts) => wattsToDbm(picowatts * 1e-12),
			V: voltsToDbm,
			mV: (millivolts) => voltsToDbm(millivolts * 1e-3),
			µV: (microvolts) => voltsToDbm(microvolts * 1e-6)
		}
	},
	density: { name: 'power density', base: 'dBm/Hz', units: { 'dBm/Hz': 1 } },
	ratio: { name: 'ratio', base: 'dB', units: { dB: 1 } },
	relative: { name: 'level against the carrier', base: 'dBc', units: { dBc: 1 } },
	'relative-density': { name: 'density against the carrier', base: 'dBc/Hz', units: { 'dBc/Hz': 1 } },
	field: { name: 'field strength', base: 'dBµV/m', units: { 'dBµV/m': 1 } },
	share: { name: 'percentage', base: '%', units: { '%': 1 } },
	number: { name: 'plain number', base: '1', units: {} }
} as const satisfies Record<string, DimensionSpec>;

export type Dimension = keyof typeof dimensions;
export const dimensionSpec = (dimension: Dimension): DimensionSpec => dimensions[dimension];

/** The dimension whose units include `symbol`; '1' is a plain number. */
export function dimensionOf(symbol: string): Dimension | undefined {
	if (symbol === '1') return 'number';
	const names = Object.keys(dimensions) as Dimension[];
	return names.find((name) => Object.hasOwn(dimensionSpec(name).units, symbol));
}

/**
 * `value` in `symbol` as a value in the base unit of its dimension, at 50 Ω.
 * @throws RangeError for a unit nobody knows
 */
export function toBase(value: number, symbol: string): number {
	const dimension = dimensionOf(symbol);
	if (!dimension) throw new RangeError(`no such unit: ${symbol}`);
	const step = dimensionSpec(dimension).units[symbol] ?? 1;
	return typeof step === 'number' ? value * step : step(value);
}
