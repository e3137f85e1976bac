import type { TypedAnswers } from '$lib/schemas/answer';
import type { ExerciseQuestion } from '$lib/schemas/questions/question';
import type { GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { readAnswer } from '$lib/server/bench/grading/questions/registry';
import { DomainError, type Issue } from '$lib/server/errors';

/**
 * What was typed, chosen or pointed at, as the grader takes it. A question left out or left blank stays unanswered.
 * @param answers only to questions that are asked
 * @throws DomainError `invalid` naming each question, and the field within, whose answer is none of the kind asked for
 */
export function parseAnswers(
	questions: readonly ExerciseQuestion[],
	answers: TypedAnswers
): Record<string, GivenAnswer> {
	const issues: Issue[] = [];
	const given: Record<string, GivenAnswer> = {};
	for (const question of questions) {
		const typed = Object.hasOwn(answers, question.id) ? answers[question.id] : undefined;
		const read = typed ? readAnswer(question, typed) : null;
		if (!read) continue;
		if ('given' in read) given[question.id] = read.given;
		else
			issues.push(
				...read.issues.map(({ field, message }) => ({ field: `answers.${question.id}.${field}`, message }))
			);
	}
	if (issues.length > 0) throw new DomainError('invalid', 'Some of the answers can’t be read.', { issues });
	return given;
}
