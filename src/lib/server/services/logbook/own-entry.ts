import type { EntryView } from '$lib/schemas/logbook';
import { LogbookEntry } from '$lib/server/db/models/logbook-entry';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentEntry } from '$lib/server/present/logbook';
import { entryWords } from './entry-words';
import { refuseStrangers } from './refuse-strangers';

/** One's own entry. @throws DomainError `not_found`, alike for one that isn't there and somebody else's */
export async function getOwnEntry(actor: Actor, id: number): Promise<LogbookEntry> {
	refuseStrangers(actor);
	const entry = await LogbookEntry.findOne({ where: { id, userId: actor.id } });
	if (!entry) throw new DomainError('not_found', 'There is no such entry.');
	return entry;
}

export async function getEntry(actor: Actor, id: number): Promise<EntryView> {
	const entry = await getOwnEntry(actor, id);
	return presentEntry(entry, entryWords(entry.kind, entry.content));
}

/** Writes the note of an entry anew. @throws DomainError `not_found` */
export async function noteEntry(actor: Actor, id: number, note: string): Promise<void> {
	await (await getOwnEntry(actor, id)).update({ note });
}

/** @throws DomainError `not_found` */
export async function removeEntry(actor: Actor, id: number): Promise<void> {
	await (await getOwnEntry(actor, id)).destroy();
}
