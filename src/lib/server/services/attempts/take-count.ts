import type { Transaction } from 'sequelize';
import type { ReadingResponse } from '$lib/schemas/attempt';
import type { CountRequest } from '$lib/schemas/reading';
import { countFrequency } from '$lib/server/bench/receiver/count';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Reading } from '$lib/server/db/models/reading';
import { SetUp } from '$lib/server/db/models/set-up';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentReading } from '$lib/server/present/reading';
import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import { firstUnfinishedRow } from './advance-bench';
import { getAttempt, lockOpenAttempt } from './get-attempt';
import { preparedBench, type PreparedBench } from './prepared-bench';
import { latestSetUp } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';

/**
 * Counts a frequency as evidence, with the set-up in force: takes the next row number, which names the count's chance, and
 * `gateS` of bench time. A sweep under way ends there; sweeping goes on after it, holds and averages too.
 * @throws DomainError `invalid` with the reason when no line stands 20 dB over its surroundings: then no time passes either;
 *   `conflict` before the first sweep and while the input protection waits for its reset
 */
export async function takeCount(
	actor: Actor,
	attemptId: number,
	request: CountRequest,
	now: Date
): Promise<ReadingResponse> {
	const seen = await getAttempt(actor, 'attempt.work', attemptId);
	const source = signalSource(seen, await exerciseOf(seen));
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		const setUp = await setUpInForce(attempt, transaction);
		const bench = preparedBench(source, setUp.settings);
		refuseOutOfReach(request, bench, source.definition.benchTimeS - attempt.clockS);
		const { nextRow: row, clockS } = attempt;
		const { scene, profile } = bench.drawn;
		const count = countFrequency(scene, profile, bench.resolved, bench.seed, request, row, clockS);
		if ('problem' in count) refuse('request', `Nothing to count: ${count.problem}.`);
		await passGate(attempt, setUp, request.gateS, now, transaction);
		const { kind, value, unit, spread, remarks } = count;
		const reading = await Reading.create(
			{
				attemptId,
				setUpId: setUp.id,
				fromRow: row,
				toRow: row,
				trace: null,
				mode: null,
				rowCount: 1,
				request,
				...{ kind, value, unit, spread, remarks },
				parts: null,
				traceHash: null,
				clockS,
				engineVersion: attempt.engineVersion,
				takenAt: now
			},
			{ transaction }
		);
		return { reading: presentReading(reading, setUp.number) };
	});
}

function refuse(field: string, message: string): never {
	throw new DomainError('invalid', message, { issues: [{ field, message }] });
}

async function setUpInForce(attempt: Attempt, transaction: Transaction): Promise<SetUp> {
	if (attempt.protectionTripped) {
		throw new DomainError('conflict', 'The input protection has tripped. Nothing comes in to be counted.');
	}
	const setUp = await latestSetUp(attempt.id, transaction);
	if (!setUp) throw new DomainError('conflict', 'Nothing has been swept yet: sweep first, then count.');
	return setUp;
}

function refuseOutOfReach({ atHz, gateS }: CountRequest, { drawn }: PreparedBench, leftS: number): void {
	const { startHz, stopHz } = drawn.profile;
	if (atHz < startHz || atHz > stopHz) {
		const range = `${formatFrequency(startHz)} to ${formatFrequency(stopHz)}`;
		refuse('request.atHz', `This receiver counts from ${range}.`);
	}
	if (gateS > leftS / 2) {
		const gate = formatTime(gateS);
		refuse('request.gateS', `A gate of ${gate} would use more than half of the receiver time left.`);
	}
}

/** Spends the gate's bench time: the set-up's sweeps end here, and the log goes on with the same set-up after it. */
async function passGate(
	attempt: Attempt,
	setUp: SetUp,
	gateS: number,
	now: Date,
	transaction: Transaction
): Promise<void> {
	const endRow = firstUnfinishedRow(attempt);
	const nextRow = attempt.nextRow + 1;
	const clockS = attempt.clockS + gateS;
	await setUp.update({ endRow }, { transaction });
	await attempt.update({ nextRow, clockS, rowEndS: clockS, streamToken: null }, { transaction });
	const { settings, restartRow } = setUp;
	await SetUp.create(
		{
			attemptId: attempt.id,
			number: setUp.number + 1,
			settings,
			firstRow: nextRow,
			clockS,
			restartRow,
			tripped: false,
			loggedAt: now
		},
		{ transaction }
	);
}
