import { Op } from 'sequelize';
import type { SessionView } from '$lib/schemas/account';
import { sessionIdOf } from '$lib/server/auth/sessions';
import { Session } from '$lib/server/db/models/session';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentSession } from '$lib/server/present/session';

const MOST_SHOWN = 100;

/** This person's open sign-ins, the one that asks first, then by when they were last used. */
export async function listSessions(
	actor: Actor,
	currentToken: string | undefined,
	now: Date
): Promise<SessionView[]> {
	if (!may(actor, 'profile.read', { ownerId: actor.id }))
		throw new DomainError('forbidden', 'This account is not yours.');
	const sessions = await Session.findAll({
		where: { userId: actor.id, expiresAt: { [Op.gt]: now } },
		order: [['lastUsedAt', 'DESC']],
		limit: MOST_SHOWN
	});
	const currentId = currentToken === undefined ? null : sessionIdOf(currentToken);
	const views = sessions.map((session) => presentSession(session, currentId));
	return [...views.filter(({ current }) => current), ...views.filter(({ current }) => !current)];
}
