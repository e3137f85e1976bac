import { mostInDocument } from '$lib/schemas/logbook';
import { LogbookEntry } from '$lib/server/db/models/logbook-entry';
import { User } from '$lib/server/db/models/user';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentEntry } from '$lib/server/present/logbook';
import { entryWords } from './entry-words';
import { logbookDocument } from './pdf/logbook-document';
import { refuseStrangers } from './refuse-strangers';

/**
 * Entries of one's own as a document, in the order they were kept.
 * @throws DomainError `invalid` for none or too many; `not_found` when one isn't there or is somebody else's
 */
export async function exportLogbookPdf(actor: Actor, ids: readonly number[], now: Date): Promise<Buffer> {
	refuseStrangers(actor);
	const chosen = [...new Set(ids)];
	if (chosen.length === 0 || chosen.length > mostInDocument) {
		const message = `choose 1 to ${mostInDocument} entries`;
		throw new DomainError('invalid', `Choose 1 to ${mostInDocument} entries for the document.`, {
			issues: [{ field: 'entry', message }]
		});
	}
	const entries = await LogbookEntry.findAll({
		where: { id: chosen, userId: actor.id },
		order: [
			['keptAt', 'ASC'],
			['id', 'ASC']
		]
	});
	if (entries.length < chosen.length) throw new DomainError('not_found', 'There is no such entry.');
	const person = await User.findByPk(actor.id, { attributes: ['displayName'], rejectOnEmpty: true });
	return logbookDocument(
		entries.map((entry) => ({
			...presentEntry(entry, entryWords(entry.kind, entry.content)),
			receiver: entry.content.receiver
		})),
		{ who: person.displayName, at: now }
	);
}
