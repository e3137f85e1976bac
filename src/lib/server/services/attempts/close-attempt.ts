import type { Transaction } from 'sequelize';
import type { AnswersRequest } from '$lib/schemas/attempt';
import type { Finding as FindingDocument } from '$lib/schemas/finding';
import type { GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { Answer } from '$lib/server/db/models/answer';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { Reading } from '$lib/server/db/models/reading';
import type { PlacedExercise } from '$lib/server/db/queries/find-exercise';
import { attemptRecord } from './attempt-record';
import { drawnFor } from './prepared-bench';
import { setUpLog } from './set-up-log';
import { signalSource } from './signal-source';

/** What is handed in: as typed, and as numbers in the questions' own units. Both empty when the attempt is given up. */
export interface HandedIn {
	typed: AnswersRequest['answers'];
	given: Record<string, GivenAnswer>;
}

/** Grades a locked, open attempt, keeps what the grader says of it, and closes it for good. */
export async function closeAttempt(
	attempt: Attempt,
	exercise: PlacedExercise,
	{ typed, given }: HandedIn,
	now: Date,
	transaction: Transaction
): Promise<FindingDocument> {
	const { id: attemptId, engineVersion } = attempt;
	const log = await setUpLog(attemptId, transaction);
	const readings = await Reading.findAll({ where: { attemptId }, order: [['id', 'ASC']], transaction });
	const drawn = drawnFor(signalSource(attempt, exercise));
	const finding = gradeAnswer({ drawn, ...attemptRecord(log, readings, given) });
	const rows = Object.entries(given).map(([question, { value }]) => {
		const found = finding.questions.find(({ id }) => id === question);
		const { text, unit, readingId } = typed[question];
		return {
			...{ attemptId, question, text, unit, value, readingId: readingId ?? null },
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
	return finding;
}
