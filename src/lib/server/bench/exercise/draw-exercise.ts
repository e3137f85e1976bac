import type { Exercise } from '$lib/schemas/exercise';
import { BenchError } from '../bench-error';
import { mistakesApart } from '../grading/mistakes-apart';
import type { Seed } from '../receiver/random';
import { drawParameters } from './draw-parameters';
import type { DrawnExercise } from './drawn-exercise';
import { fillExercise } from './fill-exercise';

const MAX_REDRAWS = 500;

/**
 * The exercise that one seed gives. Draws on which two mistakes would report numbers too near to be told apart
 * are turned down and drawn again, the same way every time.
 * @throws ExerciseError by field; BenchError when no draw keeps the mistakes apart
 */
export function drawExercise(exercise: Exercise, seed: Seed): DrawnExercise {
	for (let redraw = 0; redraw < MAX_REDRAWS; redraw++) {
		const drawn = fillExercise(exercise, drawParameters(exercise, seed, redraw), seed, redraw);
		if (mistakesApart(drawn)) return drawn;
	}
	throw new BenchError('parameters', `${MAX_REDRAWS} draws, and none keeps the mistakes watched apart`);
}
