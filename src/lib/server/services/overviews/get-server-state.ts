import { Op, QueryTypes } from 'sequelize';
import type { ServerState } from '$lib/schemas/overview';
import { sequelize } from '$lib/server/db/connection';
import { Session } from '$lib/server/db/models/session';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { countStreams } from '../attempts/open-streams';

/** How the process that answers, and its database, are doing. */
export async function getServerState(actor: Actor, now: Date): Promise<ServerState> {
	if (!may(actor, 'admin.enter'))
		throw new DomainError('forbidden', 'This part of the site is not for your role.');
	const [{ version }] = await sequelize.query<{ version: string }>('SELECT VERSION() AS version', {
		type: QueryTypes.SELECT
	});
	return {
		node: process.versions.node,
		database: version,
		startedAt: new Date(now.getTime() - process.uptime() * 1000).toISOString(),
		streams: countStreams(),
		sessions: await Session.count({ where: { expiresAt: { [Op.gt]: now } } })
	};
}
