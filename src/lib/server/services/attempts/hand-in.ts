import type { AnswersRequest, FindingResponse } from '$lib/schemas/attempt';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { closeAttempt } from './close-attempt';
import { lockOpenAttempt } from './get-attempt';
import { parseAnswers } from './parse-answers';
import { refuseForeignParts } from './refuse-foreign-parts';
import { exerciseOf } from './signal-source';

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
		return { finding: await closeAttempt(attempt, exercise, { typed: answers, given }, now, transaction) };
	});
}
