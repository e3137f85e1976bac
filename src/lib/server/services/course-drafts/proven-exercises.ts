import type { ExerciseState } from '$lib/schemas/desk';
import { hashOfExercise } from '$lib/server/content/content-hash';
import { ExerciseProof } from '$lib/server/db/models/exercise-proof';
import { Job } from '$lib/server/db/models/job';
import { shippedHashes } from '../proofs/shipped-hashes';
import { PROVE } from '../proofs/prove-job';

/** An exercise's file: its content's hash, and what it holds. */
export interface ExerciseText {
	path: string;
	hash: string;
	bytes: Uint8Array;
}

/** How exercises stand, in their order. @param published hashes of the newest edition's files */
export async function exerciseStatesOf(
	courseId: number,
	exercises: readonly ExerciseText[],
	published: ReadonlySet<string>
): Promise<ExerciseState[]> {
	const hashes = exercises.map(({ bytes }) => hashOfExercise(Buffer.from(bytes).toString('utf8')));
	const proofs = await ExerciseProof.findAll({ where: { hash: hashes }, attributes: ['hash', 'passed'] });
	const passed = new Map(proofs.map((proof) => [proof.hash, proof.passed]));
	const pending = await Job.findAll({
		where: { kind: PROVE, subject: hashes, state: ['waiting', 'running'] },
		attributes: ['subject']
	});
	const proving = new Set(pending.map(({ subject }) => subject));
	const shipped = await shippedHashes(courseId);
	return exercises.map(({ hash }, i) => {
		if (proving.has(hashes[i])) return 'proving';
		if (passed.get(hashes[i]) === false) return 'failed';
		const isProven = passed.get(hashes[i]) === true || shipped.has(hash);
		if (!isProven) return 'draft';
		return published.has(hash) ? 'published' : 'proven';
	});
}
