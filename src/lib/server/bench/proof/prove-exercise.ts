import type { Exercise } from '$lib/schemas/exercise';
import type { SweepWith } from '../exercise/bench-session';
import { drawExercise } from '../exercise/draw-exercise';
import { prepareSweep } from '../receiver/sweep';
import { proofTable, type ProofTable } from './proof-table';
import { proveSeed, type SeedProof } from './prove-seed';

export interface ProofOptions {
	/** How many seeds, from `fromSeed` upwards. */
	seeds: number;
	fromSeed: number;
	/** Called after each seed with how many are done. */
	onProgress?: (done: number) => void;
	/** The receiver; a test may plant a fault in it. */
	sweepWith?: SweepWith;
}

/**
 * Proves an exercise over many seeds: the taught method passes, each mistake made on the bench fails and is named.
 * Fails at the first seed that can't be drawn.
 * @throws BenchError when a seed can't be drawn
 */
export function proveExercise(exercise: Exercise, options: ProofOptions): ProofTable {
	const { seeds, fromSeed, onProgress, sweepWith = prepareSweep } = options;
	const proofs: SeedProof[] = [];
	for (let i = 0; i < seeds; i++) {
		proofs.push(proveSeed(exercise, fromSeed + i, sweepWith));
		onProgress?.(i + 1);
	}
	const { questions } = drawExercise(exercise, fromSeed);
	const tolerances = new Map(questions.map(({ id, tolerance }) => [id, tolerance]));
	return proofTable(exercise.slug, fromSeed, proofs, tolerances);
}
