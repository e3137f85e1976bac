import type { WrittenEmissions } from '$lib/schemas/questions/emissions';
import { profileNamed } from '$lib/server/bench/receiver/profiles';
import type { Exercise } from '$lib/schemas/exercise';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { AnswerStep } from '../question-type';
import { stepFields } from '../step-fields';

/** Rows have names of their own, are all asked alike, and may be off by what the receiver may be. */
export function checkEmissions(
	written: WrittenEmissions,
	field: string,
	{ receiver }: Exercise
): ExerciseIssue[] {
	const { emissions, ghosts, toleranceDb } = written;
	const issues: ExerciseIssue[] = [];
	const ids = [...emissions, ...ghosts].map(({ id }) => id);
	ids.forEach((id, i) => {
		if (ids.indexOf(id) !== i) issues.push({ field: `${field}.emissions`, message: `${id} stands twice` });
	});
	if (new Set(emissions.map(({ breaks }) => breaks === undefined)).size > 1)
		issues.push({ field: `${field}.emissions`, message: 'breaks is asked of each row or of none' });
	const { levelErrorDb } = typeof receiver === 'string' ? profileNamed(receiver) : receiver;
	if (toleranceDb < levelErrorDb)
		issues.push({
			field: `${field}.toleranceDb`,
			message: `must be at least the receiver’s level error, ${levelErrorDb} dB`
		});
	return issues;
}

export const checkRows = (step: AnswerStep, _: WrittenEmissions, field: string): ExerciseIssue[] =>
	stepFields(step, ['rows'], field);
