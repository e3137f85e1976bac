import { Op, QueryTypes } from 'sequelize';
import type { ServerState } from '$lib/schemas/overview';
import { sequelize } from '$lib/server/db/connection';
import { Session } from '$lib/server/db/models/session';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { countStreams } from '../attempts/open-streams';

/** How the process that answers, and its database, are doing. */
export async function getServerState(actor: Actor, now: Date): Promise<ServerState> {
	refuseUnless(actor, 'admin.enter');
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
