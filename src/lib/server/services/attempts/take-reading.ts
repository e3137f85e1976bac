import { createHash } from 'node:crypto';
import type { ReadingResponse, TakeReadingRequest } from '$lib/schemas/attempt';
import { isProblem, type Reading as TakenReading } from '$lib/measure/reading';
import { takeReading as readOff } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { Reading } from '$lib/server/db/models/reading';
import type { SetUp } from '$lib/server/db/models/set-up';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentReading } from '$lib/server/present/reading';
import { countRows, drawnRows, lastRows, type DrawnRows } from './drawn-rows';
import { getAttempt, lockOpenAttempt } from './get-attempt';
import { resolvedFor } from './prepared-bench';
import { isReplayable, replayedTrace } from './replayed-trace';
import { setUpLog, setUpOfRow } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';
import { takeCount } from './take-count';

/** A trace of more rows than this is not replayed: an average's greatest count. */
const MOST_ROWS = 10_000;
const TOO_MUCH = 'That is more sweeps than can be replayed. Hold or average fewer.';

type Rows = NonNullable<TakeReadingRequest['rows']>;
type Shown = ResolvedSettings['traces'][number];

/**
 * Takes a reading as evidence: sweeps the rows that make up the trace again, takes the reading off them here, and keeps
 * that value with a hash of the trace. Whatever number the page showed plays no part.
 * A count is taken on the bench itself.
 * @throws DomainError `invalid`, naming what the replay doesn't support: rows never drawn or of another set-up, a trace
 *   that isn't there, a reading that has no number
 */
export async function takeReading(
	actor: Actor,
	attemptId: number,
	{ rows, trace: number, request }: TakeReadingRequest,
	now: Date
): Promise<ReadingResponse> {
	if (request.kind === 'count') return takeCount(actor, attemptId, request, now);
	// The schema lets no other reading through without them.
	if (!rows || number === undefined) refuse('rows', 'Say what it is read from.');
	const attempt = await getAttempt(actor, 'attempt.work', attemptId);
	const source = signalSource(attempt, await exerciseOf(attempt));
	const log = await setUpLog(attemptId);
	const setUp = drawnSetUp(log, rows);
	const resolved = resolvedFor(source, setUp.settings);
	const shown = shownTrace(resolved, number);
	const stretches = rowsOfTrace(log, rows, shown);
	if (!isReplayable(shown, stretches, resolved.points)) refuse('rows', TOO_MUCH);
	const rowCount = countRows(stretches);
	const levelsDbm = await replayedTrace(source, stretches, shown, resolved.scale);
	const reading = readOff(traceOf(resolved, shown, rowCount, levelsDbm), request);
	if (isProblem(reading)) refuse('request', `${reading.problem} ${reading.needs}`);
	return inTransaction(async (transaction) => {
		// Handed in meanwhile: then the reading comes too late.
		await lockOpenAttempt(actor, attemptId, transaction);
		const { kind, value, unit, spread, remarks, parts } = reading as TakenReading;
		const taken = await Reading.create(
			{
				attemptId,
				setUpId: setUp.id,
				fromRow: stretches[0].fromRow,
				toRow: rows.to,
				trace: number,
				mode: shown.mode,
				rowCount,
				request,
				kind,
				value,
				unit,
				spread,
				remarks,
				parts: parts ?? null,
				traceHash: hashOf(levelsDbm),
				engineVersion: attempt.engineVersion,
				takenAt: now
			},
			{ transaction }
		);
		return { reading: presentReading(taken, setUp.number) };
	});
}

function refuse(field: string, message: string): never {
	throw new DomainError('invalid', message, { issues: [{ field, message }] });
}

function drawnSetUp(log: SetUp[], rows: Rows): SetUp {
	const setUp = setUpOfRow(log, rows.to);
	if (!setUp || setUp.drawnTo === null || rows.to > setUp.drawnTo) {
		refuse('rows.to', `Row ${rows.to} was not drawn on this bench, so nothing can be read off it.`);
	}
	if (rows.from < setUp.restartRow) {
		refuse(
			'rows.from',
			`Holds and averages started again at row ${setUp.restartRow}: the trace holds nothing older.`
		);
	}
	return setUp;
}

function shownTrace({ traces }: ResolvedSettings, number: number): Shown {
	const shown = traces[number - 1];
	if (!shown)
		refuse('trace', `The set-up has ${traces.length} of the traces 1 to 4; there is no trace ${number}.`);
	if (shown.mode === 'kept') {
		refuse('trace', 'A kept trace is read from the rows it was kept of, with the set-up of those rows.');
	}
	return shown;
}

function rowsOfTrace(log: SetUp[], rows: Rows, { mode, count }: Shown): DrawnRows[] {
	const drawn = drawnRows(log, rows.from, rows.to);
	const stretches =
		mode === 'live' ? lastRows(drawn, 1) : mode === 'average' ? lastRows(drawn, count) : drawn;
	if (countRows(stretches) > MOST_ROWS) refuse('rows', TOO_MUCH);
	return stretches;
}

function traceOf(resolved: ResolvedSettings, shown: Shown, count: number, levelsDbm: Float32Array): Trace {
	const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
	const setUp = { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb };
	return { ...setUp, mode: shown.mode, count, levelsDbm };
}

const hashOf = (levelsDbm: Float32Array): string =>
	createHash('sha256')
		.update(new Uint8Array(levelsDbm.buffer, levelsDbm.byteOffset, levelsDbm.byteLength))
		.digest('hex');
