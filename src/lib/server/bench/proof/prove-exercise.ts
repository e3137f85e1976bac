import type { Exercise } from '$lib/schemas/exercise';
import type { SweepWith } from '../exercise/bench-session';
import { drawExercise } from '../exercise/draw-exercise';
import { numberQuestions } from '../exercise/drawn-exercise';
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

/** What each of `seeds` seeds from `fromSeed` says. @throws BenchError when one can't be drawn */
export function proveSeeds(exercise: Exercise, options: ProofOptions): SeedProof[] {
	const { seeds, fromSeed, onProgress, sweepWith } = options;
	return Array.from({ length: seeds }, (_, i) => {
		const proof = proveSeed(exercise, fromSeed + i, sweepWith);
		onProgress?.(i + 1);
		return proof;
	});
}

/** What proofs of seeds from `fromSeed` upwards, in order, say together. */
export function tableOf(exercise: Exercise, fromSeed: number, proofs: readonly SeedProof[]): ProofTable {
	const asked = numberQuestions(drawExercise(exercise, fromSeed));
	const tolerances = new Map(asked.map(({ id, tolerance }) => [id, tolerance]));
	return proofTable(exercise.slug, fromSeed, proofs, tolerances);
}

/**
 * Proves an exercise over many seeds: the taught method passes, each mistake made on the bench fails and is named.
 * @throws BenchError when a seed can't be drawn
 */
export const proveExercise = (exercise: Exercise, options: ProofOptions): ProofTable =>
	tableOf(exercise, options.fromSeed, proveSeeds(exercise, options));
