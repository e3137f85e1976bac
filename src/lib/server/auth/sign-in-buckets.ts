import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { SignInBucket } from '$lib/server/db/models/sign-in-bucket';
import { inTransaction } from '$lib/server/db/transaction';
import { giveBackTry, takeTry, type Limit } from '$lib/server/domain/sign-in-limit';
import { DomainError } from '$lib/server/errors';

/** One thing whose tries are counted: `name` says which, such as “account a@b.example”. */
export interface Counted {
	name: string;
	limit: Limit;
}

/** Hashed, so that the table holds no addresses of people; sorted, so that two sign-ins lock in the same order. */
const keyed = (counted: Counted[]) =>
	counted
		.map(({ name, limit }) => ({ id: createHash('sha256').update(name).digest(), limit }))
		.sort((a, b) => a.id.compare(b.id));

async function lockBucket(id: Buffer, now: Date, transaction: Transaction): Promise<SignInBucket> {
	// Sets nothing on a duplicate, but locks the row for writing; INSERT IGNORE would lock it for reading, and two
	// that then both want to write stop each other.
	await SignInBucket.bulkCreate([{ id, level: 0, updatedAt: now }], {
		updateOnDuplicate: ['id'],
		transaction
	});
	const bucket = await SignInBucket.findByPk(id, { lock: transaction.LOCK.UPDATE, transaction });
	if (!bucket) throw new Error('A bucket just made is gone');
	return bucket;
}

/**
 * Counts one try against each of `counted`, before the password is looked at, so that tries sent at once all count.
 * Throws DomainError `too_many`, counting nothing, if any of them is full.
 */
export function takeTries(counted: Counted[], now: Date): Promise<void> {
	return inTransaction(async (transaction) => {
		const takes = [];
		for (const { id, limit } of keyed(counted)) {
			const row = await lockBucket(id, now, transaction);
			takes.push({ row, ...takeTry(row, limit, now) });
		}
		const retryAfterS = Math.max(...takes.map((take) => take.retryAfterS));
		if (retryAfterS > 0) {
			const message = `Too many tries with a wrong password. The next one is possible in ${retryAfterS} s.`;
			throw new DomainError('too_many', message, { retryAfterS });
		}
		for (const { row, bucket } of takes) await row.update(bucket, { transaction });
	});
}

/** Takes one try back from each of `counted`, once the password has proved right. */
export async function giveBackTries(counted: Counted[], now: Date, transaction: Transaction): Promise<void> {
	for (const { id, limit } of keyed(counted)) {
		const row = await lockBucket(id, now, transaction);
		await row.update(giveBackTry(row, limit, now), { transaction });
	}
}
