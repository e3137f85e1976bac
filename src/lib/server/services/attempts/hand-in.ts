import type { AnswersRequest, FindingResponse } from '$lib/schemas/attempt';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { closeAttempt } from './close-attempt';
import { parseAnswers } from './parse-answers';
import { refuseForeignParts } from './refuse-foreign-parts';

/**
 * Hands the answers in: graded at once, kept with what the grader says of them, and the attempt closed for good.
 * @throws DomainError `invalid` naming each answer that can't be read, and when there is none at all: nothing is kept then
 */
export async function handIn(
	actor: Actor,
	attemptId: number,
	{ answers }: AnswersRequest,
	now: Date
): Promise<FindingResponse> {
	const finding = await closeAttempt(
		actor,
		attemptId,
		async (attempt, exercise, transaction) => {
			await refuseForeignParts(attempt, answers, transaction);
			const given = parseAnswers(exercise.definition.questions, answers);
			if (Object.keys(given).length === 0) {
				const issues = [{ field: 'answers', message: 'answer at least one question' }];
				throw new DomainError('invalid', 'There is nothing to hand in yet.', { issues });
			}
			return { typed: answers, given };
		},
		now
	);
	return { finding };
}
