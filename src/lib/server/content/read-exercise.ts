import type { Exercise } from '$lib/schemas/exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { ContentError } from './content-error';
import { hashOfExercise } from './content-hash';
import { addressIn, textIn, type ContentTree } from './content-tree';

/** Exercises that have been checked before, by the hash of their file's text; what is read anew is added. */
export type CheckedExercises = Map<string, Exercise>;

/** An exercise, checked. @throws ContentError at its first fault */
export function readExercise(
	tree: ContentTree,
	path: string,
	slug: string,
	checked: CheckedExercises
): Exercise {
	const text = textIn(tree, path);
	const address = addressIn(tree, path);
	const hash = hashOfExercise(text);
	try {
		const exercise = checked.get(hash) ?? parseExerciseText(text, address);
		checked.set(hash, exercise);
		if (exercise.slug === slug) return exercise;
	} catch (cause) {
		if (!(cause instanceof ExerciseError)) throw cause;
		const [{ field, message, line }] = cause.issues;
		throw new ContentError(address, line ?? 1, field, message);
	}
	throw new ContentError(address, 1, 'slug', `must be the file’s name, ${slug}`);
}
