import { hash } from '@node-rs/argon2';
import { beforeEach, describe, expect, it } from 'vitest';
import { hashPassword, isOutdatedHash, verifyPassword } from '$lib/server/auth/passwords';
import { createSession, validateSession } from '$lib/server/auth/sessions';
import { hashToken } from '$lib/server/auth/token';
import { Session } from '$lib/server/db/models/session';
import { SignInBucket } from '$lib/server/db/models/sign-in-bucket';
import { User } from '$lib/server/db/models/user';
import type { Actor } from '$lib/server/domain/role';
import { changeDisplayName } from '$lib/server/services/accounts/change-display-name';
import { changePassword, type PasswordRequest } from '$lib/server/services/accounts/change-password';
import { endAllSessions, endOneSession, endOtherSessions } from '$lib/server/services/accounts/end-sessions';
import { listSessions } from '$lib/server/services/accounts/list-sessions';
import { signIn } from '$lib/server/services/accounts/sign-in';
import { createUser, PASSWORD } from '../../factories/user';

let user: User;
let actor: Actor;
beforeEach(async () => {
	({ user, actor } = await createUser('apprentice'));
	await SignInBucket.destroy({ where: {} });
});
const open = async (token: string) => (await validateSession(token)) !== null;
const stored = () => User.findByPk(user.id, { rejectOnEmpty: true });
const NEW = 'seven slow sweeps';
const change = (over: Partial<PasswordRequest> = {}) =>
	changePassword(
		actor,
		{ presentPassword: PASSWORD, newPassword: NEW, address: '192.0.2.9', userAgent: null, ...over },
		new Date()
	);
const signInWith = (password: string) =>
	signIn(
		{ email: user.email, password, address: '192.0.2.8', deviceToken: undefined, sessionToken: undefined },
		new Date()
	);

describe('the list of sessions', () => {
	it('shows one’s own that are open, from what and when, the one that asks first', async () => {
		const here = await createSession(user.id, 'computer');
		await createSession(user.id, 'phone');
		const over = await createSession(user.id, 'tablet');
		await Session.update({ expiresAt: new Date(0) }, { where: { id: hashToken(over.token) } });
		await createSession((await createUser('apprentice')).user.id, 'tablet');
		const sessions = await listSessions(actor, here.token, new Date());
		expect(sessions.map(({ device, current }) => [device, current])).toEqual([
			['computer', true],
			['phone', false]
		]);
		expect(JSON.stringify(sessions)).not.toContain(hashToken(here.token).toString('hex'));
	});

	it('notes within five minutes that a session is used, and from what device it was begun', async () => {
		const { sessionToken } = await signIn(
			{
				email: user.email,
				password: PASSWORD,
				address: '192.0.2.8',
				deviceToken: undefined,
				sessionToken: undefined,
				userAgent: 'Mozilla/5.0 (Linux; Android 1; K) Mobile'
			},
			new Date()
		);
		const old = new Date(Date.now() - 6 * 60_000);
		await Session.update({ lastUsedAt: old }, { where: { id: hashToken(sessionToken) } });
		await validateSession(sessionToken);
		const [session] = await listSessions(actor, sessionToken, new Date());
		expect(session.device).toBe('phone');
		expect(Date.parse(session.lastUsedAt)).toBeGreaterThan(old.getTime() + 5 * 60_000);
	});

	it('ends one, all others, or all; never somebody else’s', async () => {
		const [here, there, third] = await Promise.all([1, 2, 3].map(() => createSession(user.id, 'computer')));
		const stranger = await createUser('administrator');
		const theirs = await createSession(stranger.user.id, 'computer');
		const numberOf = async ({ token }: { token: string }) =>
			(await Session.findByPk(hashToken(token), { rejectOnEmpty: true })).number;
		await expect(endOneSession(actor, await numberOf(theirs))).rejects.toMatchObject({ code: 'not_found' });
		await expect(endOneSession(stranger.actor, await numberOf(here))).rejects.toMatchObject({
			code: 'not_found'
		});
		const number = await numberOf(there);
		await endOneSession(actor, number);
		await expect(endOneSession(actor, number)).rejects.toMatchObject({ code: 'not_found' });
		expect(await Promise.all([here, there, third].map(({ token }) => open(token)))).toEqual([
			true,
			false,
			true
		]);
		expect(await endOtherSessions(actor, here.token)).toBe(1);
		expect(await endOtherSessions(actor, here.token)).toBe(0);
		expect(await open(here.token)).toBe(true);
		await endAllSessions(actor);
		expect(await open(here.token)).toBe(false);
		expect(await open(theirs.token)).toBe(true);
	});
});

it('a display name changes for its owner alone', async () => {
	const other = await createUser('apprentice');
	await changeDisplayName(actor, 'Þóra Lyng');
	expect((await stored()).displayName).toBe('Þóra Lyng');
	expect((await User.findByPk(other.user.id))?.displayName).toBe(other.user.displayName);
});

describe('a changed password', () => {
	it('opens the account instead of the old one, ends every session and goes on under a new token', async () => {
		const before = [await createSession(user.id, 'computer'), await createSession(user.id, 'phone')];
		const { token } = await change();
		expect(await open(token)).toBe(true);
		for (const session of before) expect(await open(session.token)).toBe(false);
		await expect(signInWith(PASSWORD)).rejects.toMatchObject({ code: 'invalid' });
		await expect(signInWith(NEW)).resolves.toBeDefined();
	});

	it.each([
		['a wrong present one', { presentPassword: 'wrong' }, 'presentPassword'],
		['a short new one', { newPassword: 'short' }, 'newPassword']
	])('is refused for %s, the field named and nothing changed', async (_, over, field) => {
		const session = await createSession(user.id, 'computer');
		await expect(change(over)).rejects.toMatchObject({ code: 'invalid', issues: [{ field }] });
		expect((await stored()).passwordHash).toBe(user.passwordHash);
		expect(await open(session.token)).toBe(true);
	});

	it('asked for ten times with a wrong one has to wait, and signing in still works', async () => {
		const codes = [];
		for (let i = 0; i < 12; i += 1)
			codes.push(await change({ presentPassword: 'wrong' }).catch(({ code }: { code: string }) => code));
		expect(codes).toEqual([...Array<string>(10).fill('invalid'), 'too_many', 'too_many']);
		await expect(change()).rejects.toMatchObject({ code: 'too_many' });
		await expect(signInWith(PASSWORD)).resolves.toBeDefined();
	});

	it('asked for twice at once changes once', async () => {
		const results = await Promise.allSettled([change(), change({ newPassword: 'eight slow sweeps' })]);
		expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
		expect(await Session.count({ where: { userId: user.id } })).toBe(1);
	});
});

describe('signing in', () => {
	it('makes a costlier hash of the password where the kept one was cheap, and notes when it was', async () => {
		const cheap = await hash(PASSWORD, { memoryCost: 8 * 1024, timeCost: 1, parallelism: 1 });
		expect([isOutdatedHash(cheap), isOutdatedHash(await hashPassword('x'))]).toEqual([true, false]);
		await user.update({ passwordHash: cheap });
		await expect(signInWith('wrong')).rejects.toMatchObject({ code: 'invalid' });
		expect((await stored()).passwordHash).toBe(cheap);
		expect((await stored()).lastSignInAt).toBeNull();
		await signInWith(PASSWORD);
		const { passwordHash, lastSignInAt } = await stored();
		expect(isOutdatedHash(passwordHash)).toBe(false);
		expect(await verifyPassword(passwordHash, PASSWORD)).toBe(true);
		expect(lastSignInAt).toBeInstanceOf(Date);
		await signInWith(PASSWORD);
		expect((await stored()).passwordHash).toBe(passwordHash);
	});

	it('with the old password, while it is being changed, leaves no session of it open', async () => {
		for (let i = 0; i < 5; i += 1) {
			const fresh = await createUser('apprentice');
			({ user, actor } = fresh);
			const [changed, signedIn] = await Promise.allSettled([change(), signInWith(PASSWORD)]);
			expect(changed.status).toBe('fulfilled');
			if (signedIn.status === 'fulfilled') expect(await open(signedIn.value.sessionToken)).toBe(false);
		}
	});
});
