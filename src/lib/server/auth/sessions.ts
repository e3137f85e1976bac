import { Lucia, TimeSpan } from 'lucia';
import type { Transaction } from 'sequelize';
import type { DeviceKind } from '$lib/schemas/device-kind';
import { SessionAdapter } from './session-adapter';
import { createToken, hashToken } from './token';

const IDLE = new TimeSpan(12, 'h');
const ABSOLUTE = new TimeSpan(7, 'd');
/** How far an expiry may lag behind the last request; saves a write at most of them. */
const LAG = new TimeSpan(5, 'm');

interface UserAttributes {
	email: string;
	displayName: string;
	roles: string[];
}

interface SessionAttributes {
	createdAt: Date;
	device: string;
	lastUsedAt: Date;
}

declare module 'lucia' {
	interface Register {
		Lucia: Lucia<SessionAttributes, UserAttributes>;
		UserId: number;
		DatabaseUserAttributes: UserAttributes;
		DatabaseSessionAttributes: SessionAttributes;
	}
}

export interface NewSession {
	/** Goes into the cookie and nowhere else. */
	token: string;
	expiresAt: Date;
}

export interface SignedIn {
	user: { id: number } & UserAttributes;
	expiresAt: Date;
	/** True when the expiry has just moved, and the cookie's with it. */
	renewed: boolean;
}

const lucia = (transaction?: Transaction) =>
	new Lucia<SessionAttributes, UserAttributes>(new SessionAdapter(transaction), {
		sessionExpiresIn: IDLE,
		getSessionAttributes: ({ createdAt, device, lastUsedAt }) => ({ createdAt, device, lastUsedAt }),
		getUserAttributes: ({ email, displayName, roles }) => ({ email, displayName, roles })
	});

/** The id under which the session of this token is kept. */
export const sessionIdOf = (token: string): Buffer => hashToken(token);

const idOf = (token: string): string => hashToken(token).toString('hex');

/** Starts a session of this person, under a token never used before. */
export async function createSession(
	userId: number,
	device: DeviceKind,
	transaction?: Transaction
): Promise<NewSession> {
	const token = createToken();
	const now = new Date();
	const attributes = { createdAt: now, device, lastUsedAt: now };
	const session = await lucia(transaction).createSession(userId, attributes, { sessionId: idOf(token) });
	return { token, expiresAt: session.expiresAt };
}

/** Who holds this token; null if nobody, or no longer: 12 h after the last request or 7 d after signing in. */
export async function validateSession(token: string): Promise<SignedIn | null> {
	const { session, user } = await lucia().validateSession(idOf(token));
	if (!session) return null;
	const lastMs = session.createdAt.getTime() + ABSOLUTE.milliseconds();
	if (lastMs <= Date.now()) {
		await lucia().invalidateSession(session.id);
		return null;
	}
	const expiresAt = new Date(Math.min(Date.now() + IDLE.milliseconds(), lastMs));
	// Lucia moves an expiry only in its second half and knows no last moment, so what it has set is set right here.
	const renewed = session.fresh || expiresAt.getTime() - session.expiresAt.getTime() > LAG.milliseconds();
	// Near its last moment a session's expiry stands still, and it is used all the same.
	const used = Date.now() - session.lastUsedAt.getTime() > LAG.milliseconds();
	if (renewed || used) await new SessionAdapter().touchSession(session.id, expiresAt, new Date());
	return { user, expiresAt: renewed ? expiresAt : session.expiresAt, renewed };
}

/** Ends the session of this token, if there is one. */
export const endSession = (token: string, transaction?: Transaction): Promise<void> =>
	lucia(transaction).invalidateSession(idOf(token));

/** Ends every session of this person. */
export const endSessionsOf = (userId: number, transaction?: Transaction): Promise<void> =>
	lucia(transaction).invalidateUserSessions(userId);

/** Removes sessions that have run out; at most 1000 a call. */
export const deleteExpiredSessions = (): Promise<void> => lucia().deleteExpiredSessions();
