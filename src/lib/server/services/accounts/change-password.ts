import type { Transaction } from 'sequelize';
import type { PasswordChange } from '$lib/schemas/account';
import { hashPassword, verifyPassword } from '$lib/server/auth/passwords';
import { createSession, endSessionsOf, type NewSession } from '$lib/server/auth/sessions';
import { giveBackTries, takeTries, type Counted } from '$lib/server/auth/sign-in-buckets';
import { User } from '$lib/server/db/models/user';
import { inTransaction } from '$lib/server/db/transaction';
import { addressBlock } from '$lib/server/domain/address-block';
import { deviceKind } from '$lib/server/domain/device-kind';
import { refusedPassword } from '$lib/server/domain/password-rules';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { ACCOUNT_LIMIT, ADDRESS_LIMIT } from '$lib/server/domain/sign-in-limit';
import { DomainError } from '$lib/server/errors';

export interface PasswordRequest extends Pick<PasswordChange, 'presentPassword' | 'newPassword'> {
	/** The network address that asks. */
	address: string;
	userAgent: string | null;
}

/**
 * Changes this person's password. Every session ends, and the one that asked goes on under a new token.
 * Throws DomainError: `too_many` as at signing in, or `invalid` naming the field.
 */
export async function changePassword(actor: Actor, request: PasswordRequest, now: Date): Promise<NewSession> {
	if (!may(actor, 'profile.change', { ownerId: actor.id }))
		throw new DomainError('forbidden', 'This account is not yours.');
	const user = await User.findByPk(actor.id, { rejectOnEmpty: true });
	const problem = refusedPassword(request.newPassword, user);
	if (problem) refuse('newPassword', problem);

	// Buckets of their own: whoever guesses at an open page must not lock the owner out of signing in.
	const counted: Counted[] = [
		{ name: `address ${addressBlock(request.address)}`, limit: ADDRESS_LIMIT },
		{ name: `password of ${actor.id}`, limit: ACCOUNT_LIMIT }
	];
	await takeTries(counted, now);
	if (!(await verifyPassword(user.passwordHash, request.presentPassword)))
		refuse('presentPassword', 'This is not the password of this account.');

	const passwordHash = await hashPassword(request.newPassword);
	return inTransaction(async (transaction) => {
		await giveBackTries(counted, now, transaction);
		await replaceHash(user, passwordHash, transaction);
		await endSessionsOf(user.id, transaction);
		return createSession(user.id, deviceKind(request.userAgent), transaction);
	});
}

/** Throws DomainError `conflict` if somebody has changed the password in the meantime. */
async function replaceHash(seen: User, passwordHash: string, transaction: Transaction): Promise<void> {
	const user = await User.findByPk(seen.id, { lock: transaction.LOCK.UPDATE, transaction });
	if (user?.passwordHash !== seen.passwordHash)
		throw new DomainError('conflict', 'The password has just been changed elsewhere. Sign in anew.');
	await user.update({ passwordHash }, { transaction });
}

function refuse(field: keyof PasswordChange, message: string): never {
	throw new DomainError('invalid', 'The password was not changed.', { issues: [{ field, message }] });
}
