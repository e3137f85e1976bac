import { Op } from 'sequelize';
import { endSessionsOf, sessionIdOf } from '$lib/server/auth/sessions';
import { Session } from '$lib/server/db/models/session';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

function requireOwnAccount(actor: Actor): void {
	if (!may(actor, 'profile.change', { ownerId: actor.id }))
		throw new DomainError('forbidden', 'This account is not yours.');
}

/** Ends one of this person's sessions. Throws DomainError `not_found` if they have none of that number. */
export async function endOneSession(actor: Actor, number: number): Promise<void> {
	requireOwnAccount(actor);
	const ended = await Session.destroy({ where: { number, userId: actor.id } });
	if (ended === 0) throw new DomainError('not_found', 'This session has ended already.');
}

/** Ends every session of this person but the one that asks; returns how many there were. */
export async function endOtherSessions(actor: Actor, currentToken: string): Promise<number> {
	requireOwnAccount(actor);
	return Session.destroy({ where: { userId: actor.id, id: { [Op.ne]: sessionIdOf(currentToken) } } });
}

/** Ends every session of this person, the one that asks too. */
export async function endAllSessions(actor: Actor): Promise<void> {
	requireOwnAccount(actor);
	await endSessionsOf(actor.id);
}
