/** The first exercise of content/: as its author wrote it, as the bench takes it, and with one entry changed. */
import { readFileSync } from 'node:fs';
import { parse } from 'yaml';
import type { Exercise } from '$lib/schemas/exercise';
import { ExerciseError, type ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import { parseExercise } from '$lib/server/bench/exercise/parse-exercise';

const PATH =
	'../../content/spectrum-measurement/06-power-of-a-spread-signal/channel-power-behind-a-lead.yaml';
export const firstExerciseText = readFileSync(new URL(PATH, import.meta.url), 'utf8');
export const firstExercise: Exercise = parseExercise(parse(firstExerciseText));

/** Anything an author might write, in a place that a test knows. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any
type Draft = any;

/** The exercise after `change`. @throws ExerciseError when that makes it invalid */
export function changedExercise(change: (draft: Draft) => void): Exercise {
	const draft = parse(firstExerciseText) as Draft;
	change(draft);
	return parseExercise(draft);
}

/** Every fault that `change` brings into it. */
export function issuesAfter(change: (draft: Draft) => void): readonly ExerciseIssue[] {
	try {
		changedExercise(change);
		return [];
	} catch (error) {
		if (error instanceof ExerciseError) return error.issues;
		throw error;
	}
}
