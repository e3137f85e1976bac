import type { Transaction } from 'sequelize';
import { isKnownDevice, rememberDevice } from '$lib/server/auth/known-devices';
import { hashPassword, isOutdatedHash, verifyPassword } from '$lib/server/auth/passwords';
import { createSession, endSession } from '$lib/server/auth/sessions';
import { giveBackTries, takeTries, type Counted } from '$lib/server/auth/sign-in-buckets';
import { User } from '$lib/server/db/models/user';
import { UserRole } from '$lib/server/db/models/user-role';
import { inTransaction } from '$lib/server/db/transaction';
import { addressBlock } from '$lib/server/domain/address-block';
import { deviceKind } from '$lib/server/domain/device-kind';
import { normaliseEmail } from '$lib/server/domain/email';
import { homeOf } from '$lib/server/domain/rooms';
import { ACCOUNT_LIMIT, ADDRESS_LIMIT, DEVICE_LIMIT } from '$lib/server/domain/sign-in-limit';
import { DomainError } from '$lib/server/errors';
import { actorOf } from '$lib/server/auth/actor';
import { forgetExpired } from './forget-expired';

export interface SignInRequest {
	email: string;
	password: string;
	/** The network address that asks. */
	address: string;
	/** What the browser's device and session cookies hold, if anything. */
	deviceToken: string | undefined;
	sessionToken: string | undefined;
	/** What the browser says it is. */
	userAgent?: string | null;
}

export interface SignInResult {
	sessionToken: string;
	expiresAt: Date;
	deviceToken: string;
	/** Path of the page on which this person starts. */
	home: string;
}

/**
 * Signs a person in with e-mail address and password, under a new session; the browser's old one ends.
 * Throws DomainError: `too_many`, or `invalid` with the same words whether the address, the password or both are wrong.
 */
export async function signIn(request: SignInRequest, now: Date): Promise<SignInResult> {
	const email = normaliseEmail(request.email);
	const user = await User.findOne({ where: { email }, include: [{ model: UserRole, required: false }] });
	const known = await isKnownDevice(request.deviceToken, user?.id);
	const counted: Counted[] = [
		{ name: `address ${addressBlock(request.address)}`, limit: ADDRESS_LIMIT },
		known
			? { name: `device ${request.deviceToken} of ${email}`, limit: DEVICE_LIMIT }
			: { name: `account ${email}`, limit: ACCOUNT_LIMIT }
	];
	await takeTries(counted, now);

	const right = await verifyPassword(user?.passwordHash, request.password);
	if (!user || !right || user.disabledAt) refuse();

	const newHash = isOutdatedHash(user.passwordHash) ? await hashPassword(request.password) : null;
	const result = await inTransaction(async (transaction) => {
		await giveBackTries(counted, now, transaction);
		await noteSignIn(user, request.password, newHash, now, transaction);
		if (request.sessionToken) await endSession(request.sessionToken, transaction);
		const deviceToken = await rememberDevice(request.deviceToken, user.id, now, transaction);
		const { token, expiresAt } = await createSession(user.id, deviceKind(request.userAgent), transaction);
		return { sessionToken: token, expiresAt, deviceToken };
	});
	await forgetExpired(now);
	const roles = (user.userRoles ?? []).map(({ role }) => role);
	return { ...result, home: homeOf(actorOf({ id: user.id, roles })) };
}

/**
 * Notes when this was, under a lock on the account, and puts a costlier hash in the place of an old one.
 * Throws DomainError `invalid` if the account or its password has changed since it was looked at.
 */
async function noteSignIn(
	seen: User,
	password: string,
	newHash: string | null,
	now: Date,
	transaction: Transaction
): Promise<void> {
	const user = await User.findByPk(seen.id, { lock: transaction.LOCK.UPDATE, transaction });
	const same = user?.passwordHash === seen.passwordHash;
	if (!user || user.disabledAt || !(same || (await verifyPassword(user.passwordHash, password)))) refuse();
	await user.update(
		{ lastSignInAt: now, ...(newHash && same && { passwordHash: newHash }) },
		{ transaction }
	);
}

function refuse(): never {
	throw new DomainError('invalid', 'This e-mail address and password don’t belong together.');
}
