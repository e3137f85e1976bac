import type { Transaction } from 'sequelize';
import { Attempt } from '$lib/server/db/models/attempt';
import { may, type Action } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/**
 * The attempt, if the policy lets `actor` do `action` to it.
 * @throws DomainError `not_found`, alike for one that isn't there and one that this person may not know of
 */
export async function getAttempt(
	actor: Actor,
	action: Action,
	attemptId: number,
	transaction?: Transaction
): Promise<Attempt> {
	return permitted(actor, action, await Attempt.findByPk(attemptId, { transaction }));
}

/**
 * The attempt with its row locked until the transaction ends, still open.
 * @throws DomainError `not_found` as above; `conflict` when it has been handed in
 */
export async function lockOpenAttempt(
	actor: Actor,
	attemptId: number,
	transaction: Transaction
): Promise<Attempt> {
	const found = await Attempt.findByPk(attemptId, { transaction, lock: transaction.LOCK.UPDATE });
	const attempt = permitted(actor, 'attempt.work', found);
	if (attempt.closedAt) throw new DomainError('conflict', 'This attempt has been handed in.');
	return attempt;
}

function permitted(actor: Actor, action: Action, attempt: Attempt | null): Attempt {
	if (!attempt || !may(actor, action, { ownerId: attempt.userId, closed: attempt.closedAt !== null })) {
		throw new DomainError('not_found', 'There is no such attempt.');
	}
	return attempt;
}
