/** The logbook: readings, pictures and set-ups that a person has put by, across exercises. */
import { z } from 'zod';
import { readingId } from './answer';
import { readingView } from './attempt';
import { digits } from './number';
import { reportPicture } from './report';
import { resolvedSettings } from './settings';
import { rowNumber } from './sweep-stream';

/** Entries that a person may have. */
export const mostEntries = 1000;
/** Entries that one document may hold. */
export const mostInDocument = 40;
const note = z.string().trim().max(1000, 'must not be longer than 1000 characters');

/** `POST /api/attempts/[id]/logbook`: a reading that the server took, the traces as they stood after a row, or the set-up in force. */
export const keepRequest = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('reading'), readingId, note: note.default('') }),
	z.strictObject({ kind: z.literal('picture'), row: rowNumber, note: note.default('') }),
	z.strictObject({ kind: z.literal('set-up'), note: note.default('') })
]);
/** What of a report is put by. */
export const keepReportForm = z.strictObject({ what: z.enum(['picture', 'readings']).default('picture') });
export const entryKinds = ['reading', 'picture', 'set-up'] as const;

/** What an entry holds, for good. */
export const entryContent = z.strictObject({
	title: z.string(),
	/** "6.1" */
	place: z.string(),
	attempt: z.int(),
	receiver: z.string(),
	/** With which it was read or swept. */
	resolved: resolvedSettings,
	reading: readingView.nullable(),
	picture: reportPicture.nullable()
});

export const noteForm = z.strictObject({ note: note.default('') });

const day = z.union([z.literal(''), z.iso.date()]).default('');
/** What a logbook is asked for; days are UTC and both are included. */
export const logbookFilter = z.object({
	q: z.string().trim().max(100).default(''),
	exercise: z.string().max(80).default(''),
	kind: z.union([z.literal(''), z.enum(entryKinds)]).default(''),
	from: day,
	to: day,
	page: z.coerce.number().int().min(1).max(1000).default(1)
});

/** `GET /learn/logbook/pdf?entry=&entry=`: the entries of a document. */
export const documentQuery = z.strictObject({
	entry: z.array(digits.pipe(z.int().min(1).max(4_294_967_295)))
});

/** An entry as a list shows it. */
export const entryLine = z.strictObject({
	id: z.int(),
	kind: z.enum(entryKinds),
	keptAt: z.iso.datetime(),
	exercise: z.strictObject({ slug: z.string(), title: z.string(), place: z.string() }),
	attempt: z.strictObject({ id: z.int(), number: z.int() }),
	/** "channel power, 25 kHz" */
	what: z.string(),
	/** The reading’s value, shown; null for others. */
	value: z.strictObject({ figure: z.string(), unit: z.string() }).nullable(),
	note: z.string()
});
export const logbookView = z.strictObject({
	entries: z.array(entryLine),
	total: z.int(),
	page: z.int(),
	pages: z.int(),
	/** Those that the logbook has anything of. */
	exercises: z.array(z.strictObject({ slug: z.string(), title: z.string() }))
});
export const entryView = z.strictObject({
	...entryLine.shape,
	setUp: z.array(z.strictObject({ label: z.string(), text: z.string() })),
	resolved: resolvedSettings,
	picture: reportPicture.nullable(),
	remarks: z.array(z.string()),
	spread: z.string().nullable()
});

export type KeepRequest = z.input<typeof keepRequest>;
export type ParsedKeepRequest = z.output<typeof keepRequest>;
export type EntryContent = z.infer<typeof entryContent>;
export type LogbookFilter = z.output<typeof logbookFilter>;
export type EntryLine = z.infer<typeof entryLine>;
export type LogbookView = z.infer<typeof logbookView>;
export type EntryView = z.infer<typeof entryView>;
