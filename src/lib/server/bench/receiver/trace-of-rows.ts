import { combineRows } from '$lib/measure/combine-rows';
import type { Trace } from '$lib/measure/trace';
import type { ResolvedSettings } from '$lib/schemas/settings';

/** What trace `index` of a set-up makes of its rows, in their order. */
export function traceOfRows(rows: Float32Array[], resolved: ResolvedSettings, index: number): Trace {
	const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
	const { mode, count } = resolved.traces[index];
	const used = mode === 'average' ? Math.min(count, rows.length) : mode === 'live' ? 1 : rows.length;
	return {
		...{ startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb },
		mode,
		count: used,
		levelsDbm: combineRows(rows, mode, count, scale)
	};
}
