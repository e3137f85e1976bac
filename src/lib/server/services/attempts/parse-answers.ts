import type { TypedAnswer } from '$lib/schemas/attempt';
import type { ExerciseQuestion } from '$lib/schemas/exercise';
import type { GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { DomainError, type Issue } from '$lib/server/errors';
import { dimensionOf } from '$lib/units/dimension';
import { parseQuantity } from '$lib/units/parse-quantity';

/**
 * What was typed, as numbers in the questions' own units. A question left out or left blank stays unanswered.
 * @param answers only to questions that are asked
 * @throws DomainError `invalid` naming each question whose answer isn't a quantity of the kind asked for
 */
export function parseAnswers(
	questions: Pick<ExerciseQuestion, 'id' | 'unit'>[],
	answers: Record<string, TypedAnswer>
): Record<string, GivenAnswer> {
	const issues: Issue[] = [];
	const given: Record<string, GivenAnswer> = {};
	for (const { id, unit } of questions) {
		const typed = Object.hasOwn(answers, id) ? answers[id] : undefined;
		if (!typed || typed.text.trim() === '') continue;
		const dimension = dimensionOf(unit);
		if (!dimension) throw new Error(`Question ${id} asks for ${unit}, which nobody can type`);
		if (dimensionOf(typed.unit) !== dimension) {
			issues.push({
				field: `answers.${id}.unit`,
				message: `${typed.unit} is no unit for an answer in ${unit}.`
			});
			continue;
		}
		const parsed = parseQuantity(typed.text, dimension, typed.unit);
		if (!parsed.ok) issues.push({ field: `answers.${id}.text`, message: parsed.message });
		else given[id] = { value: parsed.value, readingId: typed.readingId?.toString() };
	}
	if (issues.length > 0) throw new DomainError('invalid', 'Some of the answers can’t be read.', { issues });
	return given;
}
