import { z } from 'zod';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';
import { ExerciseProof } from '$lib/server/db/models/exercise-proof';
import type { JobContext } from '$lib/server/jobs/run-job';
import { askBenchLater, PROVING_THREADS } from '../desk-threads/desk-threads';

/** The kind of these jobs; their subject is the exercise's hash. */
export const PROVE = 'prove';
/** Seeds of a proof that lets an exercise be published. */
export const PROOF_SEEDS = 200;
const FROM_SEED = 1;
/** Seeds between two looks at whether the job is still wanted. */
const BATCH = 4;

export const provePayload = z.strictObject({
	hash: z.string(),
	text: z.string(),
	seeds: z.int().min(1).max(PROOF_SEEDS)
});

/** Proves an exercise and keeps what came of it. Done twice, it says the same twice. */
export async function proveJob(payload: unknown, context: JobContext): Promise<void> {
	const { hash, text, seeds } = provePayload.parse(payload);
	const startedMs = performance.now();
	const exercise = await askBenchLater('parse', { text });
	const batches: SeedProof[][] = [];
	const starts = Array.from({ length: Math.ceil(seeds / BATCH) }, (_, i) => i * BATCH);
	let next = 0;
	let done = 0;
	await context.progress(0, seeds);
	/** One after the other, until there are no more: several of these run at once. */
	const work = async (): Promise<void> => {
		while (next < starts.length) {
			const index = next++;
			const count = Math.min(BATCH, seeds - starts[index]);
			const fromSeed = FROM_SEED + starts[index];
			batches[index] = await askBenchLater('prove', { exercise, fromSeed, seeds: count });
			done += count;
			await context.progress(done, seeds);
		}
	};
	await Promise.all(Array.from({ length: PROVING_THREADS }, work));
	const result = await askBenchLater('result', { exercise, fromSeed: FROM_SEED, proofs: batches.flat() });
	const row = { hash, seeds, passed: result.passed, result, madeAt: new Date() };
	await ExerciseProof.upsert({ ...row, tookMs: Math.round(performance.now() - startedMs) });
}
