import type { Transaction } from 'sequelize';
import type { TypedAnswer, TypedAnswers } from '$lib/schemas/answer';
import type { Finding as FindingDocument } from '$lib/schemas/finding';
import type { AttemptRecord, GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { Answer } from '$lib/server/db/models/answer';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { Reading } from '$lib/server/db/models/reading';
import type { PlacedExercise } from '$lib/server/db/queries/find-exercise';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { attemptRecord } from './attempt-record';
import { lockOpenAttempt } from './get-attempt';
import { gradeInWorker } from './grade-in-worker';
import { setUpLog } from './set-up-log';
import { exerciseOf } from './signal-source';

/** What is handed in: as typed, and as the grader takes it. Both empty when the attempt is given up. */
export interface HandedIn {
	typed: TypedAnswers;
	given: Record<string, GivenAnswer>;
}
/** Checks what is handed in against a locked, open attempt. */
export type CheckHandedIn = (
	attempt: Attempt,
	exercise: PlacedExercise,
	transaction: Transaction
) => Promise<HandedIn>;

/** So often is grading done again when something was swept or read meanwhile; after that the attempt waits for it. */
const MOST_SNAPSHOTS = 3;

/**
 * Grades an open attempt, keeps what the grader says of it, and closes it for good. Grading goes on in another thread and
 * without a lock: what was graded is kept only if the attempt is still as it was then.
 * @throws what `check` throws; DomainError `conflict` when it has been closed already
 */
export async function closeAttempt(
	actor: Actor,
	attemptId: number,
	check: CheckHandedIn,
	now: Date
): Promise<FindingDocument> {
	const look = async (transaction: Transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		const exercise = await exerciseOf(attempt, transaction);
		const handedIn = await check(attempt, exercise, transaction);
		const log = await setUpLog(attemptId, transaction);
		const readings = await Reading.findAll({ where: { attemptId }, order: [['id', 'ASC']], transaction });
		const record = attemptRecord(log, readings, handedIn.given);
		return { attempt, handedIn, job: { seed: attempt.seed, definition: exercise.definition, record } };
	};
	for (let snapshots = 1; ; snapshots++) {
		const seen = await inTransaction(look);
		const graded = await gradeInWorker(seen.job);
		const kept = await inTransaction(async (transaction) => {
			const { attempt, handedIn, job } = await look(transaction);
			const isSame = isSameRecord(job.record, seen.job.record);
			if (!isSame && snapshots < MOST_SNAPSHOTS) return null;
			const finding = isSame ? graded : await gradeInWorker(job);
			await keep(attempt, handedIn, finding, now, transaction);
			return finding;
		});
		if (kept) return kept;
	}
}

const isSameRecord = (a: AttemptRecord, b: AttemptRecord): boolean => JSON.stringify(a) === JSON.stringify(b);

async function keep(
	attempt: Attempt,
	{ typed, given }: HandedIn,
	finding: FindingDocument,
	now: Date,
	transaction: Transaction
): Promise<void> {
	const { id: attemptId, engineVersion } = attempt;
	const rows = Object.entries(given).map(([question, answer]) => {
		const found = finding.questions.find(({ id }) => id === question);
		return {
			...{ attemptId, question, ...columnsOf(typed[question], answer) },
			verdict: found?.verdict ?? 'unanswered',
			mistakes: found?.mistakes.map(({ kind }) => kind) ?? []
		};
	});
	await Answer.bulkCreate(rows, { transaction });
	await Finding.create(
		{ attemptId, passed: finding.passed, finding, engineVersion, gradedAt: now },
		{ transaction }
	);
	await attempt.update({ closedAt: now, streamToken: null }, { transaction });
}

/** A number has columns of its own; any other answer is kept whole, as it was handed in. */
function columnsOf(typed: TypedAnswer, given: GivenAnswer) {
	if (typed.type !== 'number' || !('value' in given)) {
		const readingId = typed.type === 'uncertainty' ? (typed.readingId ?? null) : null;
		return { text: null, unit: null, value: null, readingId, typed };
	}
	const { text, unit, readingId } = typed;
	return { text, unit, value: given.value, readingId: readingId ?? null, typed: null };
}
