import { takeReading } from '$lib/measure/take-reading';
import type { Figure } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';
import { settings as settingsSchema } from '$lib/schemas/settings';
import { parseInput } from '../commands/parse-input';
import { profileNamed } from '../receiver/profiles';
import { resolveSettings } from '../receiver/resolve-settings';
import { prepareSweep } from '../receiver/sweep';
import { traceOfRows } from '../receiver/trace-of-rows';
import { settingsAt, type FigureValues } from './choices';

/**
 * A figure with its controls at `values`: its rows from row 0 at bench clock 0, what its traces make of them, and the readings.
 * The same values always give the same figure.
 * @throws BenchError when the receiver can't do that, which no choice of a checked figure brings about
 */
export function computeFigure(figure: Figure, values: FigureValues): FigureState {
	const profile = profileNamed(figure.receiver);
	const resolved = resolveSettings(parseInput(settingsSchema, settingsAt(figure, values)), profile);
	const plan = prepareSweep(figure.scene, profile, resolved, figure.seed);
	const rows: Float32Array[] = [];
	let clockS = 0;
	for (let n = 0; n < figure.sweeps && !plan.isProtected; n++) {
		rows.push(plan.row(n, clockS));
		clockS += plan.durationS(n);
	}
	const traces = rows.length === 0 ? [] : resolved.traces.map((_, i) => traceOfRows(rows, resolved, i));
	return {
		values: [...values],
		resolved,
		flags: plan.flags,
		traces: traces.map(({ mode, levelsDbm }) => ({
			mode: mode ?? 'live',
			levelsDbm: Array.from(levelsDbm, (levelDbm) => Math.round(levelDbm * 100) / 100)
		})),
		readings: traces.length === 0 ? [] : figure.readings.map((request) => takeReading(traces[0], request))
	};
}
