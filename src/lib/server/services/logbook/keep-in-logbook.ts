import type { Transaction } from 'sequelize';
import { mostEntries, type EntryContent, type EntryLine, type ParsedKeepRequest } from '$lib/schemas/logbook';
import type { Attempt } from '$lib/server/db/models/attempt';
import { LogbookEntry } from '$lib/server/db/models/logbook-entry';
import { Reading } from '$lib/server/db/models/reading';
import { SetUp } from '$lib/server/db/models/set-up';
import { User } from '$lib/server/db/models/user';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentEntryLine } from '$lib/server/present/logbook';
import { presentReading } from '$lib/server/present/reading';
import { getAttempt } from '../attempts/get-attempt';
import { drawnFor, resolvedFor, type SignalSource } from '../attempts/prepared-bench';
import { reportPicture } from '../attempts/report-picture';
import { setUpLog, setUpOfRow } from '../attempts/set-up-log';
import { exerciseOf, signalSource } from '../attempts/signal-source';
import { entryWords } from './entry-words';
import { refuseStrangers } from './refuse-strangers';

type Kept = Pick<EntryContent, 'resolved' | 'reading' | 'picture'>;

/**
 * Puts something of an attempt of one's own in the logbook, open or closed: with all that it shows, so that it stands there
 * whatever becomes of the bench. A reading is kept once; kept again, its entry is given back.
 * @throws DomainError `not_found` for another's attempt or reading; `conflict` when there is nothing to keep, when a row can't be
 *   made again, and when the logbook is full
 */
export async function keepInLogbook(
	actor: Actor,
	attemptId: number,
	request: ParsedKeepRequest,
	now: Date
): Promise<{ entry: EntryLine; created: boolean }> {
	refuseStrangers(actor);
	const attempt = await getAttempt(actor, 'attempt.work', attemptId);
	const exercise = await exerciseOf(attempt);
	const source = signalSource(attempt, exercise);
	const kept = await take(attempt, source, request);
	const content: EntryContent = {
		title: exercise.title,
		place: `${exercise.unit.number}.${exercise.number}`,
		attempt: attempt.number,
		receiver: drawnFor(source).profile.name,
		...kept
	};
	const what = entryWords(request.kind, content);
	return inTransaction(async (transaction) => {
		// One entry at a time for each person, so that the limit holds and a reading is kept once.
		await User.findByPk(actor.id, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
		const before = await findBefore(actor, request, transaction);
		if (before) return { entry: presentEntryLine(before, what), created: false };
		if ((await LogbookEntry.count({ where: { userId: actor.id }, transaction })) >= mostEntries)
			throw new DomainError('conflict', `The logbook has ${mostEntries} entries, as many as it holds.`);
		const entry = await LogbookEntry.create(
			{
				...{ userId: actor.id, attemptId, kind: request.kind, exercise: exercise.slug, content },
				readingId: request.kind === 'reading' ? request.readingId : null,
				words: `${content.place} ${content.title} ${request.kind} ${what}`,
				note: request.note,
				keptAt: now
			},
			{ transaction }
		);
		return { entry: presentEntryLine(entry, what), created: true };
	});
}

const findBefore = (actor: Actor, request: ParsedKeepRequest, transaction: Transaction) =>
	request.kind === 'reading'
		? LogbookEntry.findOne({ where: { userId: actor.id, readingId: request.readingId }, transaction })
		: null;

async function take(attempt: Attempt, source: SignalSource, request: ParsedKeepRequest): Promise<Kept> {
	const log = await setUpLog(attempt.id);
	if (request.kind === 'reading') {
		const reading = await Reading.findOne({
			where: { id: request.readingId, attemptId: attempt.id },
			include: [{ model: SetUp, as: 'setUp' }]
		});
		if (!reading?.setUp) throw new DomainError('not_found', 'There is no such reading.');
		const { settings, number } = reading.setUp;
		return {
			resolved: resolvedFor(source, settings),
			reading: presentReading(reading, number),
			picture: null
		};
	}
	if (request.kind === 'set-up') {
		const latest = log.at(-1);
		if (!latest) throw new DomainError('conflict', 'Nothing has been swept with this set-up yet.');
		return { resolved: resolvedFor(source, latest.settings), reading: null, picture: null };
	}
	const setUp = setUpOfRow(log, request.row);
	const wasDrawn = request.row <= (setUp?.drawnTo ?? -1);
	const resolved = setUp && wasDrawn ? resolvedFor(source, setUp.settings) : null;
	const picture = resolved ? await reportPicture(source, log, request.row, resolved) : null;
	if (!resolved || !picture?.traces.some(({ levelsDbm }) => levelsDbm.length > 0))
		throw new DomainError('conflict', 'That sweep was not drawn, or can’t be made again.');
	return { resolved, reading: null, picture: { ...picture, marks: [] } };
}
