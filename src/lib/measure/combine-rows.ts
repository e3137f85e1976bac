/** Sweeps to a trace: the browser and the server make the same one from the same rows. */
import { fromScale, toScale } from './scale';
import type { TraceMode, TraceScale } from './trace';

/**
 * What a trace shows after `rows`, oldest first, all since the last restart.
 * @param rows one or more, of equal length, dBm
 * @param mode live and kept show the last row; holds the extremes of all rows
 * @param count rows in an average; the last that many count, or all if there are fewer
 * @param scale what an average is the mean of: dB, mW or √mW
 * @returns levels in dBm
 */
export function combineRows(
	rows: readonly ArrayLike<number>[],
	mode: TraceMode,
	count: number,
	scale: TraceScale
): Float32Array {
	if (rows.length === 0) throw new RangeError('rows must hold at least one sweep');
	if (mode === 'max-hold') return hold(rows, (held, level) => level > held);
	if (mode === 'min-hold') return hold(rows, (held, level) => level < held);
	if (mode === 'average') return average(rows.slice(-Math.max(1, count)), scale);
	return Float32Array.from(rows[rows.length - 1]);
}

function hold(
	rows: readonly ArrayLike<number>[],
	beats: (held: number, level: number) => boolean
): Float32Array {
	const held = Float32Array.from(rows[0]);
	for (const row of rows) {
		for (let i = 0; i < held.length; i++) if (beats(held[i], row[i])) held[i] = row[i];
	}
	return held;
}

function average(rows: readonly ArrayLike<number>[], scale: TraceScale): Float32Array {
	return averageOfScaled(
		rows.map((row) => scaledRow(row, scale)),
		scale
	);
}

/** A row's levels in dBm as values on a scale: what averages add up. Worth keeping, where the same row is averaged again and again. */
export function scaledRow(row: ArrayLike<number>, scale: TraceScale): Float64Array {
	const convert = toScale[scale];
	const values = new Float64Array(row.length);
	for (let i = 0; i < values.length; i++) values[i] = convert(row[i]);
	return values;
}

/** The mean of rows that are on the scale already, one or more, of equal length; dBm. */
export function averageOfScaled(rows: readonly Float64Array[], scale: TraceScale): Float32Array {
	const points = rows[0].length;
	const sums = new Float64Array(points);
	for (const row of rows) for (let i = 0; i < points; i++) sums[i] += row[i];
	const back = fromScale[scale];
	const mean = new Float32Array(points);
	for (let i = 0; i < points; i++) mean[i] = back(sums[i] / rows.length);
	return mean;
}
