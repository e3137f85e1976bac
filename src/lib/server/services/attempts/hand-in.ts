import type { Transaction } from 'sequelize';
import type { AnswersRequest, FindingResponse } from '$lib/schemas/attempt';
import type { Finding as FindingDocument } from '$lib/schemas/finding';
import type { GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { Answer } from '$lib/server/db/models/answer';
import type { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { Reading } from '$lib/server/db/models/reading';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { attemptRecord } from './attempt-record';
import { lockOpenAttempt } from './get-attempt';
import { parseAnswers } from './parse-answers';
import { drawnFor } from './prepared-bench';
import { refuseForeignParts } from './refuse-foreign-parts';
import { setUpLog } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';

/**
 * Hands the answers in: graded at once, kept with what the grader says of them, and the attempt closed for good.
 * @throws DomainError `invalid` naming each answer that can't be read, and when there is none at all: nothing is kept then
 */
export function handIn(
	actor: Actor,
	attemptId: number,
	{ answers }: AnswersRequest,
	now: Date
): Promise<FindingResponse> {
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		await refuseForeignParts(attempt, answers, transaction);
		const exercise = await exerciseOf(attempt, transaction);
		const given = parseAnswers(exercise.definition.questions, answers);
		if (Object.keys(given).length === 0) {
			const issues = [{ field: 'answers', message: 'answer at least one question' }];
			throw new DomainError('invalid', 'There is nothing to hand in yet.', { issues });
		}
		const log = await setUpLog(attemptId, transaction);
		const readings = await Reading.findAll({ where: { attemptId }, order: [['id', 'ASC']], transaction });
		const drawn = drawnFor(signalSource(attempt, exercise));
		const finding = gradeAnswer({ drawn, ...attemptRecord(log, readings, given) });
		await store(attempt, answers, given, finding, now, transaction);
		return { finding };
	});
}

async function store(
	attempt: Attempt,
	typed: AnswersRequest['answers'],
	given: Record<string, GivenAnswer>,
	finding: FindingDocument,
	now: Date,
	transaction: Transaction
): Promise<void> {
	const rows = Object.entries(given).map(([question, { value }]) => {
		const found = finding.questions.find(({ id }) => id === question);
		const { text, unit, readingId } = typed[question];
		return {
			attemptId: attempt.id,
			question,
			text,
			unit,
			value,
			readingId: readingId ?? null,
			verdict: found?.verdict ?? 'unanswered',
			mistakes: found?.mistakes.map(({ kind }) => kind) ?? []
		};
	});
	await Answer.bulkCreate(rows, { transaction });
	const { id: attemptId, engineVersion } = attempt;
	await Finding.create(
		{ attemptId, passed: finding.passed, finding, engineVersion, gradedAt: now },
		{ transaction }
	);
	await attempt.update({ closedAt: now, streamToken: null }, { transaction });
}
