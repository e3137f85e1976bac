import type { FindingPlot } from '$lib/schemas/questions/finding';
import type { SettingsLogEntry } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { resolveSettings } from '../receiver/resolve-settings';
import { drawnTrace } from './question-plot';
import { signalLevels } from './signal-levels';

/** The plot beside a finding that no reading belongs to: the last sweep, or the last with the set-up meant, and the signal. */
export function sweptPlot(
	drawn: DrawnExercise,
	log: readonly SettingsLogEntry[],
	entry?: number
): FindingPlot {
	const meant = entry === undefined ? log.findLast(({ sweeps }) => sweeps > 0) : log.at(entry);
	const none = { band: null, at: null, point: null };
	if (!meant || meant.sweeps === 0) return { ...none, trace: null, signal: null };
	const resolved = resolveSettings(meant.settings, drawn.profile);
	const rows = { from: meant.firstRow, to: meant.firstRow + meant.sweeps - 1 };
	return { ...none, trace: drawnTrace(rows, resolved, 1), signal: signalLevels(drawn.scene, resolved) };
}
