import { QueryTypes } from 'sequelize';
import { beforeEach, describe, expect, it } from 'vitest';
import {
	createSession,
	deleteExpiredSessions,
	endSession,
	endSessionsOf,
	validateSession
} from '$lib/server/auth/sessions';
import { hashToken } from '$lib/server/auth/token';
import { sequelize } from '$lib/server/db/connection';
import { Session } from '$lib/server/db/models/session';
import type { User } from '$lib/server/db/models/user';
import { UserRole } from '$lib/server/db/models/user-role';
import { createUser } from '../../factories/user';

const HOUR_MS = 3600 * 1000;
let user: User;
beforeEach(async () => {
	({ user } = await createUser('apprentice'));
});

/** Makes the session look as it would if `hours` had gone by without a request. */
async function letHoursPass(token: string, hours: number, sinceSignIn = hours): Promise<void> {
	const session = await getSession(token);
	await session.update({
		createdAt: new Date(session.createdAt.getTime() - sinceSignIn * HOUR_MS),
		expiresAt: new Date(session.expiresAt.getTime() - hours * HOUR_MS)
	});
}

const findSession = (token: string) => Session.findByPk(hashToken(token));
async function getSession(token: string): Promise<Session> {
	const session = await findSession(token);
	if (!session) throw new Error('No such session');
	return session;
}

describe('a session', () => {
	it('tells who holds its token, with their roles as they are now', async () => {
		const { token } = await createSession(user.id, 'computer');
		const before = await validateSession(token);
		expect(before?.user).toEqual({
			id: user.id,
			email: user.email,
			displayName: user.displayName,
			roles: ['apprentice']
		});
		await UserRole.create({ userId: user.id, role: 'instructor' });
		await UserRole.destroy({ where: { userId: user.id, role: 'apprentice' } });
		expect((await validateSession(token))?.user.roles).toEqual(['instructor']);
	});

	it('has a token of 160 random bits, and no two have the same', async () => {
		const tokens = await Promise.all(
			Array.from({ length: 20 }, async () => (await createSession(user.id, 'computer')).token)
		);
		for (const token of tokens) expect(token).toMatch(/^[a-z2-7]{32}$/);
		expect(new Set(tokens).size).toBe(20);
	});

	it('keeps the SHA-256 of its token in 32 bytes, and the token nowhere', async () => {
		const { token } = await createSession(user.id, 'computer');
		const [row] = await sequelize.query<{ id: Buffer; length: number; everything: Buffer }>(
			`SELECT id, LENGTH(id) AS length, CONCAT_WS('|', id, user_id, created_at, expires_at) AS everything
			 FROM sessions WHERE user_id = :id`,
			{ type: QueryTypes.SELECT, replacements: { id: user.id } }
		);
		expect(row.length).toBe(32);
		expect(Buffer.from(row.id).equals(hashToken(token))).toBe(true);
		expect(row.everything.toString('latin1').toLowerCase()).not.toContain(token);
	});

	it.each([
		['the hash in the table', (token: string) => hashToken(token).toString('hex')],
		['the token in capitals', (token: string) => token.toUpperCase()],
		['the token and a space', (token: string) => `${token} `],
		['nothing', () => '']
	])('is not opened by %s', async (_, key) => {
		const { token } = await createSession(user.id, 'computer');
		expect(await validateSession(key(token))).toBeNull();
		expect(await validateSession(token)).not.toBeNull();
	});

	it('lasts for 12 hours without a request, and is then removed', async () => {
		const { token } = await createSession(user.id, 'computer');
		await letHoursPass(token, 11.99);
		const { token: other } = await createSession(user.id, 'computer');
		await letHoursPass(other, 12.01);
		expect(await validateSession(token)).not.toBeNull();
		expect(await validateSession(other)).toBeNull();
		expect(await findSession(other)).toBeNull();
	});

	it('lasts 12 hours more from each request, wherever in the 12 hours it comes', async () => {
		for (const hours of [0.2, 3, 5.9, 6.1, 11.9]) {
			const { token } = await createSession(user.id, 'computer');
			await letHoursPass(token, hours);
			const validated = await validateSession(token);
			expect(validated?.renewed).toBe(true);
			const left = ((await getSession(token)).expiresAt.getTime() - Date.now()) / HOUR_MS;
			expect(left).toBeGreaterThan(11.99);
			expect(validated?.expiresAt).toEqual((await getSession(token)).expiresAt);
		}
	});

	it('is not written again at each request', async () => {
		const { token } = await createSession(user.id, 'computer');
		expect((await validateSession(token))?.renewed).toBe(false);
	});

	it('ends 7 days after signing in, however busy', async () => {
		const { token } = await createSession(user.id, 'computer');
		await letHoursPass(token, 11, 7 * 24 - 2);
		const validated = await validateSession(token);
		const left = ((validated?.expiresAt.getTime() ?? 0) - Date.now()) / HOUR_MS;
		expect(left).toBeGreaterThan(1.99);
		expect(left).toBeLessThanOrEqual(2);
		expect((await getSession(token)).expiresAt).toEqual(validated?.expiresAt);
		await letHoursPass(token, 0, 2);
		expect(await validateSession(token)).toBeNull();
		expect(await findSession(token)).toBeNull();
	});

	it('ends at the next request when the person is disabled', async () => {
		const { token } = await createSession(user.id, 'computer');
		await user.update({ disabledAt: new Date() });
		expect(await validateSession(token)).toBeNull();
		await user.update({ disabledAt: null });
		expect(await validateSession(token)).toBeNull();
	});

	it('ends by itself, or with all others of the same person', async () => {
		const sessions = [
			await createSession(user.id, 'computer'),
			await createSession(user.id, 'computer'),
			await createSession(user.id, 'computer')
		];
		const stranger = await createSession((await createUser('apprentice')).user.id, 'computer');
		const open = async () =>
			Promise.all(sessions.map(async ({ token }) => (await validateSession(token)) !== null));
		await endSession(sessions[1].token);
		expect(await open()).toEqual([true, false, true]);
		await endSessionsOf(user.id);
		expect(await open()).toEqual([false, false, false]);
		expect(await validateSession(stranger.token)).not.toBeNull();
	});

	it('leaves no row behind when it has run out', async () => {
		const [old, live] = [await createSession(user.id, 'computer'), await createSession(user.id, 'computer')];
		await letHoursPass(old.token, 13);
		await deleteExpiredSessions();
		expect(await findSession(old.token)).toBeNull();
		expect(await findSession(live.token)).not.toBeNull();
	});
});
