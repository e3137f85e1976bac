import type { ProofState } from '$lib/schemas/proof-view';
import { hashOfExercise } from '$lib/server/content/content-hash';
import { ExerciseProof } from '$lib/server/db/models/exercise-proof';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { cancelJob, enqueueJob, lastJob } from '$lib/server/jobs/enqueue-job';
import { getDraft, getDraftFileRow, refuseReaders } from '../course-drafts/find-draft';
import { textOf } from '../course-drafts/get-draft-file';
import { askBench } from '../desk-threads/desk-threads';
import { shippedHashes } from './shipped-hashes';
import { PROOF_SEEDS, PROVE } from './prove-job';

/**
 * Has the exercise of a draft's file proven, as it is kept now; says how the proof stands.
 * @param wake is called when there is something to do
 * @throws DomainError `not_found`; `invalid` with the faults of an exercise that can't be read
 */
export async function askForProof(
	actor: Actor,
	slug: string,
	path: string,
	now: Date,
	wake: () => void
): Promise<ProofState> {
	refuseReaders(actor);
	const { text, hash } = await exerciseText(slug, path);
	const { faults } = await askBench('preview', { text, slug: slugOfPath(path), seed: 1 });
	if (faults.length > 0) {
		const issues = faults.map(({ field, message }) => ({ field, message }));
		throw new DomainError('invalid', 'The exercise has faults. Put them right first.', { issues });
	}
	await inTransaction(async (transaction) => {
		const payload = { hash, text, seeds: PROOF_SEEDS };
		await ExerciseProof.destroy({ where: { hash }, transaction });
		await enqueueJob({ kind: PROVE, subject: hash, payload, createdBy: actor.id, now }, transaction);
	});
	wake();
	return getProofState(actor, slug, path);
}

/** How the proof of a draft's exercise stands, for the text that is kept now. @throws DomainError `not_found` */
export async function getProofState(actor: Actor, slug: string, path: string): Promise<ProofState> {
	refuseReaders(actor);
	const { hash, contentHash, courseId } = await exerciseText(slug, path);
	const [proof, job, shipped] = await Promise.all([
		ExerciseProof.findByPk(hash),
		lastJob(PROVE, hash),
		shippedHashes(courseId)
	]);
	return {
		hash,
		job:
			job && job.state !== 'done'
				? { state: job.state, done: job.done, total: job.total, problem: job.problem }
				: null,
		result: proof?.result ?? null,
		madeAt: proof?.madeAt.toISOString() ?? null,
		tookMs: proof?.tookMs ?? null,
		shipped: shipped.has(contentHash)
	};
}

/** Takes the wish for a proof back. @throws DomainError `not_found` */
export async function cancelProof(actor: Actor, slug: string, path: string, now: Date): Promise<ProofState> {
	refuseReaders(actor);
	const { hash } = await exerciseText(slug, path);
	await cancelJob(PROVE, hash, now);
	return getProofState(actor, slug, path);
}

const slugOfPath = (path: string): string => path.replace(/^.*\//, '').replace(/\.yaml$/, '');

async function exerciseText(slug: string, path: string) {
	const draft = await getDraft(slug);
	if (!path.endsWith('.yaml')) throw new DomainError('not_found', 'The draft has no such exercise.');
	const file = await getDraftFileRow(draft.id, path);
	const text = await textOf(file.hash);
	return { text, hash: hashOfExercise(text), contentHash: file.hash, courseId: draft.courseId };
}
