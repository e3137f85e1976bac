import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { resolveSettings } from '../receiver/resolve-settings';
import { restartsTraces } from '../receiver/restarts-traces';
import type { DrawnExercise, FilledStep } from './drawn-exercise';
import { patchSettings } from './patch-settings';

/** Where the bench stands after one step of a method. */
export interface MethodState {
	/** As typed. */
	settings: Settings;
	resolved: ResolvedSettings;
	/** Rows that the traces hold: the first since they restarted, and the last; null before the first. */
	rows: { from: number; to: number } | null;
	/** The row that the next sweep would make. */
	nextRow: number;
}

/** Set-up and rows after each step of a method, from the exercise's start settings; nothing is swept. */
export function methodStates(drawn: DrawnExercise, steps: readonly FilledStep[]): MethodState[] {
	let settings = drawn.brief.start;
	let resolved = resolveSettings(settings, drawn.profile);
	let restartRow = 0;
	let nextRow = 0;
	let sweptTo = -1;
	return steps.map((step) => {
		if (step.do === 'set') {
			settings = patchSettings(settings, step.settings);
			const after = resolveSettings(settings, drawn.profile);
			if (restartsTraces(resolved, after)) restartRow = nextRow;
			resolved = after;
		}
		if (step.do === 'sweep') {
			nextRow += step.sweeps;
			sweptTo = nextRow - 1;
		}
		// A count takes a row number that nothing is swept with.
		if (step.do === 'read' && step.reading.kind === 'count') nextRow += 1;
		const rows = sweptTo >= restartRow ? { from: restartRow, to: sweptTo } : null;
		return { settings, resolved, rows, nextRow };
	});
}
