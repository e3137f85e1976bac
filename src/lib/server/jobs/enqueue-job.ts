import type { Transaction } from 'sequelize';
import { Job } from '$lib/server/db/models/job';

export interface NewJob {
	kind: string;
	/** What it is about. */
	subject: string;
	/** What its handler is given; JSON. */
	payload: unknown;
	createdBy: number | null;
	now: Date;
}

/** Has work done later, in the transaction of the change that asks for it. One that waits or runs for this subject already stays the only one. */
export async function enqueueJob(
	{ kind, subject, payload, createdBy, now }: NewJob,
	transaction: Transaction
): Promise<Job> {
	const pending = await Job.findOne({
		where: { kind, subject, state: ['waiting', 'running'] },
		lock: transaction.LOCK.UPDATE,
		transaction
	});
	if (pending) return pending;
	return Job.create({ kind, subject, payload, createdBy, createdAt: now, runAfter: now }, { transaction });
}

/** The last job about a subject. */
export const lastJob = (kind: string, subject: string): Promise<Job | null> =>
	Job.findOne({ where: { kind, subject }, order: [['id', 'DESC']] });

/** Takes a job back: one that waits never begins, one that runs is told at its next heartbeat. */
export async function cancelJob(kind: string, subject: string, now: Date): Promise<void> {
	await Job.update(
		{ state: 'cancelled', endedAt: now, leaseToken: null, leaseUntil: null },
		{ where: { kind, subject, state: ['waiting', 'running'] } }
	);
}
