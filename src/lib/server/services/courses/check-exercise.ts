import { BenchError } from '$lib/server/bench/bench-error';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import type { ExerciseContent } from '$lib/server/content';

/** Enough draws to meet each choice of a parameter; whether the exercise teaches what it says is for its proof. */
const DRAWS = 8;

/** @throws ContentError at the field that doesn't come out valid when the exercise is drawn */
export function checkExercise({ definition, errorAt }: ExerciseContent): void {
	for (let draw = 0; draw < DRAWS; draw++) {
		try {
			drawExercise(definition, `import-${draw}`);
		} catch (cause) {
			if (!(cause instanceof BenchError)) throw cause;
			throw errorAt(cause.field, cause.message);
		}
	}
}
