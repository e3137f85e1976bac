import { restartsTraces } from '$lib/server/bench/receiver/restarts-traces';
import { randomBytes } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import type { Transaction } from 'sequelize';
import type { ReceiverFlag, SweepsRequest } from '$lib/schemas/sweep-stream';
import type { Settings } from '$lib/schemas/settings';
import type { Attempt } from '$lib/server/db/models/attempt';
import { SetUp } from '$lib/server/db/models/set-up';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentFlag } from '$lib/server/present/attempt';
import { formatTime } from '$lib/units/format-quantity';
import { markDrawn } from './acknowledge-rows';
import { firstUnfinishedRow, type BenchPosition } from './advance-bench';
import { getAttempt, lockOpenAttempt } from './get-attempt';
import { preparedBench, resolvedFor, type PreparedBench, type SignalSource } from './prepared-bench';
import { latestSetUp } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';

/** Rows sent again at most; a reader farther behind loads the attempt anew. */
export const MAX_RESENT_ROWS = 500;

/** The right to sweep an attempt, until somebody else takes it. */
export interface OpenSweeps {
	attemptId: number;
	/** Holds as long as the attempt's row names it. */
	token: string;
	setUp: { number: number; firstRow: number; clockS: number; restartRow: number };
	bench: PreparedBench;
	position: BenchPosition;
	/** The first row to send. */
	fromRow: number;
	flags: ReceiverFlag[];
	/** The input protection has tripped: nothing may be swept. */
	tripped: boolean;
	benchTimeS: number;
}

/**
 * Takes the receiver of an attempt: logs the set-up if it is a new one, marks what was drawn, and ends any other stream.
 * @throws DomainError `invalid` for settings that the receiver refuses or that would waste its time; `conflict` (with nextRow) for a `from` that can't
 *   be served, for sweeping on while the input protection waits for its reset, and once the attempt is closed
 */
export async function openSweeps(
	actor: Actor,
	attemptId: number,
	request: SweepsRequest,
	now: Date
): Promise<OpenSweeps> {
	const seen = await getAttempt(actor, 'attempt.work', attemptId);
	const source = signalSource(seen, await exerciseOf(seen));
	// Before the row is locked: preparing takes its time, and a refusal must leave no trace.
	const bench = preparedBench(source, request.settings);
	const flags = bench.plan.flags.map(presentFlag);
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		// A receiver that waits for its reset is set up like any other; it only sweeps nothing.
		const waits = attempt.protectionTripped && request.resetProtection !== true;
		if (waits) await refuseSweeping(attempt, request, transaction);
		const tripped = waits || bench.plan.isProtected;
		refuseUnservable(attempt, request);
		if (request.from > 0) await markDrawn(attempt, request.from - 1, transaction);
		const setUp = await currentOrNewSetUp(
			attempt,
			request.settings,
			{ source, bench, tripped, now },
			transaction
		);
		const fromRow = Math.max(setUp.firstRow, Math.min(request.from, firstUnfinishedRow(attempt)));
		refuseFarBehind(attempt, fromRow);
		const token = randomBytes(16).toString('hex');
		await attempt.update(
			{
				streamToken: token,
				protectionTripped: tripped,
				protectionTrips: attempt.protectionTrips + (tripped && !waits ? 1 : 0)
			},
			{ transaction }
		);
		const { number, firstRow, clockS, restartRow } = setUp;
		return {
			attemptId,
			token,
			setUp: { number, firstRow, clockS, restartRow },
			bench,
			position: { nextRow: attempt.nextRow, clockS: attempt.clockS, rowEndS: attempt.rowEndS },
			fromRow,
			flags,
			tripped,
			benchTimeS: source.definition.benchTimeS
		};
	});
}

/** With the same set-up as before the only wish can be to sweep. */
async function refuseSweeping(
	attempt: Attempt,
	request: SweepsRequest,
	transaction: Transaction
): Promise<void> {
	const current = await latestSetUp(attempt.id, transaction);
	if (!current || !isDeepStrictEqual(current.settings, request.settings)) return;
	throw new DomainError(
		'conflict',
		'The input protection has tripped. Put a pad, a DC block or the matched load at the input, then reset it.'
	);
}

function refuseUnservable(attempt: Attempt, request: SweepsRequest): void {
	const { nextRow } = attempt;
	if (request.from <= nextRow) return;
	const message = `Row ${request.from} is yet to come: the next one is ${nextRow}.`;
	throw new DomainError('conflict', message, { details: { nextRow } });
}

function refuseFarBehind({ nextRow }: Attempt, fromRow: number): void {
	if (nextRow - fromRow <= MAX_RESENT_ROWS) return;
	const message = 'This bench has been swept on elsewhere. Load the attempt again.';
	throw new DomainError('conflict', message, { details: { nextRow } });
}

/**
 * A sweep that would use up most of the receiver time left is refused before it begins: sped up, it would be over in seconds,
 * and the attempt with it.
 * @throws DomainError `invalid` naming the sweep time
 */
function refuseWastefulSweep(attempt: Attempt, { source, bench }: NewSetUp): void {
	const leftS = source.definition.benchTimeS - attempt.clockS;
	const { sweepTimeS } = bench.resolved;
	if (leftS <= 0 || sweepTimeS <= leftS / 2) return;
	const left = leftS < 120 ? `${Math.floor(leftS)} s` : `${Math.floor(leftS / 60)} min`;
	const message = `A sweep of ${formatTime(sweepTimeS)} would use more than half of the ${left} of receiver time left.`;
	throw new DomainError('invalid', message, { issues: [{ field: 'settings.sweepTimeS', message }] });
}

interface NewSetUp {
	source: SignalSource;
	bench: PreparedBench;
	tripped: boolean;
	now: Date;
}

async function currentOrNewSetUp(
	attempt: Attempt,
	settings: Settings,
	given: NewSetUp,
	transaction: Transaction
): Promise<SetUp> {
	const { source, tripped, now } = given;
	const current = await latestSetUp(attempt.id, transaction);
	if (current && !current.tripped && !tripped && isDeepStrictEqual(current.settings, settings))
		return current;
	refuseWastefulSweep(attempt, given);
	const { nextRow, clockS } = attempt;
	await current?.update({ endRow: firstUnfinishedRow(attempt) }, { transaction });
	// A sweep that was under way ends here: bench time goes on from where it stood.
	await attempt.update({ rowEndS: clockS }, { transaction });
	const goesOn =
		current !== null &&
		!current.tripped &&
		!restartsTraces(resolvedFor(source, current.settings), resolvedFor(source, settings));
	return SetUp.create(
		{
			attemptId: attempt.id,
			number: (current?.number ?? -1) + 1,
			settings,
			firstRow: nextRow,
			clockS,
			restartRow: goesOn ? current.restartRow : nextRow,
			tripped,
			loggedAt: now
		},
		{ transaction }
	);
}
