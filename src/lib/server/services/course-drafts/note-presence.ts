import type { PresenceView } from '$lib/schemas/desk';
import { OpenFile } from '$lib/server/db/models/open-file';
import { othersAtFile } from '$lib/server/db/queries/draft-files';
import type { Actor } from '$lib/server/domain/role';
import { getDraft, getDraftFileRow, refuseReaders } from './find-draft';
import { nameOf } from './get-draft-file';

/** Whoever's page hasn't said for so long that the file is open has left. A page says so every ten seconds. */
export const PRESENCE_MS = 30_000;

/** Notes that the actor has a file open. @returns who else has, and how the file stands. @throws DomainError `not_found` */
export async function notePresence(
	actor: Actor,
	slug: string,
	path: string,
	now: Date
): Promise<PresenceView> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const file = await getDraftFileRow(draft.id, path);
	const since = new Date(now.getTime() - PRESENCE_MS);
	const known = await OpenFile.findOne({ where: { fileId: file.id, userId: actor.id } });
	const openedAt = known && known.seenAt >= since ? known.openedAt : now;
	await OpenFile.bulkCreate([{ fileId: file.id, userId: actor.id, openedAt, seenAt: now }], {
		updateOnDuplicate: ['openedAt', 'seenAt']
	});
	const others = await othersAtFile(file.id, actor.id, since);
	return {
		others: others.map(({ name, openedAt: at }) => ({ name, openedAt: at.toISOString() })),
		revision: file.revision,
		changedBy: await nameOf(file.changedBy),
		changedAt: file.changedAt.toISOString()
	};
}
