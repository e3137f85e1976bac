import type { Transaction } from 'sequelize';
import { KnownDevice } from '$lib/server/db/models/known-device';
import { createToken, hashToken } from './token';

/** Whether the person `userId` has signed in before with the browser that holds this token. */
export async function isKnownDevice(token: string | undefined, userId: number | undefined): Promise<boolean> {
	// Asked of the database in any case, so that an account that exists takes no longer than one that doesn't.
	const where = { id: hashToken(token ?? ''), userId: userId ?? 0 };
	return (await KnownDevice.count({ where })) > 0;
}

/** Remembers that this person signed in here; returns the token for the browser's device cookie. */
export async function rememberDevice(
	token: string | undefined,
	userId: number,
	now: Date,
	transaction: Transaction
): Promise<string> {
	const known = token === undefined ? null : await KnownDevice.findByPk(hashToken(token), { transaction });
	if (token !== undefined && known?.userId === userId) {
		await known.update({ lastUsedAt: now }, { transaction });
		return token;
	}
	const made = createToken();
	await KnownDevice.create({ id: hashToken(made), userId, createdAt: now, lastUsedAt: now }, { transaction });
	return made;
}
