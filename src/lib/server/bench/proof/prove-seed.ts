import type { Exercise } from '$lib/schemas/exercise';
import type { SweepWith } from '../exercise/bench-session';
import { drawExercise } from '../exercise/draw-exercise';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { sharingSweeps } from '../receiver/sharing-sweeps';
import { memoSweeps } from './memo-sweeps';
import type { QuestionProof } from './outcome';
import { proveNumber } from './prove-number';
import { proveWays } from './prove-ways';

export interface SeedProof extends QuestionProof {
	seed: number;
	redraws: number;
}

/** The receiver as it is, each thing that several set-ups have in common made once. */
function sharing({ scene, profile, seed }: DrawnExercise): SweepWith {
	const prepare = sharingSweeps(scene, profile, seed);
	return (_scene, _profile, resolved) => prepare(resolved);
}

/**
 * Does the taught method and makes every mistake, with one seed, on the bench.
 * @param sweepWith the receiver with a fault planted in it; absent: as it is
 */
export function proveSeed(exercise: Exercise, seed: number, sweepWith?: SweepWith): SeedProof {
	const drawn = drawExercise(exercise, seed);
	const sweeps = memoSweeps(sweepWith ?? sharing(drawn));
	const proofs = drawn.questions.map((question) =>
		question.type === 'number'
			? proveNumber(drawn, question, seed, sweeps)
			: proveWays(drawn, question, sweeps)
	);
	return {
		seed,
		redraws: drawn.redraws,
		outcomes: proofs.flatMap(({ outcomes }) => outcomes),
		nearest: proofs.flatMap(({ nearest }) => nearest),
		tooTight: proofs.flatMap(({ tooTight }) => tooTight)
	};
}
