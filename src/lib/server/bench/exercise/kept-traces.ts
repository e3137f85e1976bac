import { combineRows } from '$lib/measure/combine-rows';
import type { TraceMode, TraceScale } from '$lib/measure/trace';

type Row = ArrayLike<number>;
interface Kept {
	rows: readonly Row[];
	levelsDbm: Float32Array;
}

/** By a trace's last row: gone with it. */
const kept = new WeakMap<Row, Map<string, Kept>>();

/**
 * What `combineRows` makes of rows, once for the same rows: several readings come off one trace, and in a proof several methods.
 * The levels are everybody's: nobody changes them.
 */
export function keptTrace(
	rows: readonly Row[],
	mode: TraceMode,
	count: number,
	scale: TraceScale
): Float32Array {
	const last = rows[rows.length - 1];
	const traces = kept.get(last) ?? new Map<string, Kept>();
	kept.set(last, traces);
	const key = `${mode} ${count} ${scale} ${rows.length}`;
	const found = traces.get(key);
	if (found && found.rows.every((row, i) => row === rows[i])) return found.levelsDbm;
	const levelsDbm = combineRows(rows, mode, count, scale);
	traces.set(key, { rows, levelsDbm });
	return levelsDbm;
}
