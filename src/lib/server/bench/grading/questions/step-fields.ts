import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { AnswerStep } from './question-type';

const ALWAYS = ['do', 'question', 'why'];

/** An answer step must have what its question's type needs, and nothing that belongs to another type. */
export function stepFields(
	step: AnswerStep,
	needed: readonly (keyof AnswerStep)[],
	field: string
): ExerciseIssue[] {
	const strangers = Object.entries(step).filter(
		([key, value]) => value !== undefined && ![...ALWAYS, ...needed].includes(key)
	);
	const missing = needed.filter((key) => step[key] === undefined);
	return [
		...strangers.map(([key]) => ({
			field: `${field}.${key}`,
			message: `is no part of an answer to ${step.question}`
		})),
		...missing.map((key) => ({
			field: `${field}.${key}`,
			message: `must be given to answer ${step.question}`
		}))
	];
}
