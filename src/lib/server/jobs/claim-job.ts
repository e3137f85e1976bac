import { randomBytes } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { sequelize } from '$lib/server/db/connection';
import { Job } from '$lib/server/db/models/job';
import { inTransaction } from '$lib/server/db/transaction';

/** Whoever runs a job and doesn't say so for this long is taken for dead. */
export const LEASE_MS = 30_000;
/** A job that ends its process so often is given up. */
export const MOST_TRIES = 3;

/**
 * Takes the oldest job that waits, or whose runner has died, for whoever asks. No two get the same one.
 * @param kinds that the asker can do
 */
export function claimJob(kinds: readonly string[], now: Date): Promise<Job | null> {
	return inTransaction(async (transaction) => {
		// Sequelize's skipLocked is dropped silently for this dialect, hence the statement by hand.
		const [found] = await sequelize.query<{ id: number }>(
			`SELECT id FROM jobs
			WHERE kind IN (:kinds)
				AND ((state = 'waiting' AND run_after <= :now) OR (state = 'running' AND lease_until < :now))
			ORDER BY id LIMIT 1 FOR UPDATE SKIP LOCKED`,
			{ type: QueryTypes.SELECT, replacements: { kinds, now }, transaction }
		);
		if (!found) return null;
		const job = (await Job.findByPk(found.id, { transaction })) as Job;
		if (job.tries >= MOST_TRIES) {
			const problem = `Given up after ${MOST_TRIES} tries, each of which ended without an answer.`;
			await job.update(
				{ state: 'failed', problem, endedAt: now, leaseToken: null, leaseUntil: null },
				{ transaction }
			);
			return job;
		}
		await job.update(
			{
				state: 'running',
				tries: job.tries + 1,
				leaseToken: randomBytes(16).toString('hex'),
				leaseUntil: new Date(now.getTime() + LEASE_MS)
			},
			{ transaction }
		);
		return job;
	});
}

/** Says that a job is still being done. @returns false when it is no longer the asker's: cancelled, or taken over */
export async function renewLease(
	{ id, leaseToken }: Job,
	progress: { done: number; total: number },
	now: Date
): Promise<boolean> {
	const leaseUntil = new Date(now.getTime() + LEASE_MS);
	await Job.update({ ...progress, leaseUntil }, { where: { id, leaseToken, state: 'running' } });
	// Whether a row was found is asked for itself: the driver counts only those that changed.
	return (await Job.count({ where: { id, leaseToken, state: 'running' } })) === 1;
}

/** Ends a job. Nothing happens when it is no longer the asker's. */
export async function endJob(
	{ id, leaseToken }: Job,
	end: { state: 'done' } | { state: 'failed'; problem: string },
	now: Date
): Promise<void> {
	const problem = 'problem' in end ? end.problem.slice(0, 2000) : null;
	await Job.update(
		{ state: end.state, problem, endedAt: now, leaseToken: null, leaseUntil: null },
		{ where: { id, leaseToken, state: 'running' } }
	);
}
