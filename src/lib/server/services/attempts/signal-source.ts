import type { Transaction } from 'sequelize';
import type { Attempt } from '$lib/server/db/models/attempt';
import { findExercise, type PlacedExercise } from '$lib/server/db/queries/find-exercise';
import type { SignalSource } from './prepared-bench';

/** The attempt's exercise. Editions never change and attempts keep theirs from deletion, so it is there. */
export async function exerciseOf(attempt: Attempt, transaction?: Transaction): Promise<PlacedExercise> {
	const exercise = await findExercise(attempt.exerciseId, transaction);
	if (!exercise) throw new Error(`attempt ${attempt.id} has no exercise`);
	return exercise;
}

/** What names the attempt's signal. */
export const signalSource = (
	{ id, seed, engineVersion }: Attempt,
	exercise: PlacedExercise
): SignalSource => ({
	id,
	seed,
	engineVersion,
	definition: exercise.definition
});
