import { mostEntries, type LogbookFilter } from '$lib/schemas/logbook';
import { findLogbookEntries } from '$lib/server/db/queries/find-logbook-entries';
import { csvCell, csvFile, csvNumber } from '$lib/server/domain/csv';
import type { Actor } from '$lib/server/domain/role';
import { presentSetUp } from '$lib/server/present/set-up-lines';
import { entryWords } from './entry-words';
import { refuseStrangers } from './refuse-strangers';

const HEAD = [
	...['kept_at', 'exercise', 'title', 'attempt', 'kind', 'what', 'value', 'unit', 'spread', 'sweeps'],
	...['taken_at', 'receiver', 'set_up', 'remarks', 'note']
];

/** Everything that the filter lets through, as a table for a spreadsheet: values in base units, a line an entry. */
export async function exportLogbookCsv(actor: Actor, filter: Omit<LogbookFilter, 'page'>): Promise<string> {
	refuseStrangers(actor);
	const { rows } = await findLogbookEntries(actor.id, filter, { limit: mostEntries, offset: 0 });
	const lines = rows.map(({ kind, content, note, keptAt }) => {
		const { reading, picture, resolved, title, place, attempt, receiver } = content;
		const sweeps = reading?.rows ?? (picture && { from: picture.row, to: picture.row });
		const setUp = presentSetUp(resolved).map(({ text }) => text);
		return [
			csvCell(keptAt.toISOString()),
			// "4.10" is no number, and would lose its nought.
			csvCell(`no. ${place}`),
			csvCell(title),
			csvNumber(attempt),
			csvCell(kind),
			csvCell(plain(entryWords(kind, content))),
			csvNumber(reading?.value ?? null),
			csvCell(reading?.unit ?? ''),
			csvNumber(reading?.spread ?? null),
			csvCell(
				sweeps
					? sweeps.from === sweeps.to
						? `${sweeps.to + 1}`
						: `${sweeps.from + 1} to ${sweeps.to + 1}`
					: ''
			),
			csvCell(reading?.takenAt ?? ''),
			csvCell(receiver),
			csvCell(plain(setUp.join('; '))),
			csvCell(plain(reading?.remarks.map(({ text }) => text).join(' ') ?? '')),
			csvCell(note)
		];
	});
	return csvFile([HEAD, ...lines]);
}

/** Without the spaces and signs that only a page needs. */
const plain = (text: string): string => text.replaceAll(/[\u00a0\u202f]/g, ' ').replaceAll('−', '-');
