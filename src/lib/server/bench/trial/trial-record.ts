import { isProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import type { AttemptRecord, SettingsLogEntry } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { resolveSettings } from '../receiver/resolve-settings';
import { trialSetUp } from './trial-set-up';

/** What was done on the front page before an answer was given. */
export interface TrialDone {
	/** The resolutions looked through, in order, the present one last. */
	looks: readonly { choice: number; sweeps: number }[];
	/** The sweep on show, as the server made it. */
	levelsDbm: Float32Array;
	/** Where the two markers stand, Hz. */
	fromHz: number;
	toHz: number;
	/** In the question's unit. */
	value: number;
}

/** A trial as the grader takes it: the set-ups looked through, the distance between the markers, the answer. */
export function trialRecord(drawn: DrawnExercise, done: TrialDone): AttemptRecord {
	const log: SettingsLogEntry[] = [];
	let row = 0;
	for (const { choice, sweeps } of done.looks) {
		log.push({ settings: trialSetUp(drawn, choice), firstRow: row, sweeps, clockS: 0 });
		row += sweeps;
	}
	const { trial } = drawn.exercise;
	const last = log.at(-1);
	if (!trial || !last) throw new BenchError('looks', 'nothing was looked at');
	const request = { kind: 'delta', fromHz: done.fromHz, toHz: done.toHz } as const;
	const trace = traceOf(resolveSettings(last.settings, drawn.profile), done.levelsDbm);
	const reading = takeReading(trace, request);
	const readings = isProblem(reading)
		? []
		: [{ id: '1', request, reading, trace: 1, rows: { from: row - 1, to: row - 1 } }];
	return { log, readings, answers: { [trial.question]: { value: done.value, readingId: readings[0]?.id } } };
}

function traceOf(resolved: ResolvedSettings, levelsDbm: Float32Array) {
	const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
	const setUp = { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb };
	return { ...setUp, mode: 'live' as const, count: 1, levelsDbm };
}
