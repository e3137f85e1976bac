/** What a reader does after a lesson: an exercise that is open, one not yet right, or the next unit. */
import type { ExerciseProgress } from '$lib/schemas/course-view';

export type AfterLesson =
	| { kind: 'go-on'; exercise: ExerciseProgress; attemptId: number }
	| { kind: 'exercise'; exercise: ExerciseProgress }
	| { kind: 'done' };

/** @param exercises of the unit, in teaching order */
export function afterLesson(exercises: readonly ExerciseProgress[]): AfterLesson {
	for (const exercise of exercises) {
		if (exercise.openAttemptId !== null)
			return { kind: 'go-on', exercise, attemptId: exercise.openAttemptId };
	}
	const toDo = exercises.find(({ standing, triesLeft }) => standing !== 'passed' && triesLeft > 0);
	return toDo ? { kind: 'exercise', exercise: toDo } : { kind: 'done' };
}
