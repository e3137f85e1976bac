import type { LogbookFilter, LogbookView } from '$lib/schemas/logbook';
import { LogbookEntry } from '$lib/server/db/models/logbook-entry';
import { findLogbookEntries } from '$lib/server/db/queries/find-logbook-entries';
import type { Actor } from '$lib/server/domain/role';
import { presentEntryLine } from '$lib/server/present/logbook';
import { entryWords } from './entry-words';
import { refuseStrangers } from './refuse-strangers';

const ON_A_PAGE = 25;

/** A page of what this person has put by, the newest first. */
export async function listLogbook(actor: Actor, filter: LogbookFilter): Promise<LogbookView> {
	refuseStrangers(actor);
	const offset = (filter.page - 1) * ON_A_PAGE;
	const { rows, count } = await findLogbookEntries(actor.id, filter, { limit: ON_A_PAGE, offset });
	const exercises = await LogbookEntry.findAll({
		where: { userId: actor.id },
		attributes: ['exercise', 'content'],
		group: ['exercise'],
		order: [['exercise', 'ASC']]
	});
	return {
		entries: rows.map((entry) => presentEntryLine(entry, entryWords(entry.kind, entry.content))),
		total: count,
		page: filter.page,
		pages: Math.max(1, Math.ceil(count / ON_A_PAGE)),
		exercises: exercises.map(({ exercise, content }) => ({ slug: exercise, title: content.title }))
	};
}
