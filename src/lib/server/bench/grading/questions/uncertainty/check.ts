import type { Exercise } from '$lib/schemas/exercise';
import type { WrittenUncertainty } from '$lib/schemas/questions/uncertainty';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import { isAbsoluteLevel } from '$lib/server/bench/grading/asked';
import { profileNamed } from '$lib/server/bench/receiver/profiles';

/** Contributions have names of their own; a level's tolerance holds the receiver's error. */
export function checkUncertainty(
	{ budget, unit, toleranceDb }: WrittenUncertainty,
	field: string,
	{ receiver }: Exercise
): ExerciseIssue[] {
	const issues = budget.flatMap(({ id }, i) =>
		budget.findIndex((other) => other.id === id) === i
			? []
			: [{ field: `${field}.budget[${i}].id`, message: `${id} stands twice` }]
	);
	const { levelErrorDb } = typeof receiver === 'string' ? profileNamed(receiver) : receiver;
	if (isAbsoluteLevel(unit) && toleranceDb < levelErrorDb) {
		issues.push({
			field: `${field}.toleranceDb`,
			message: `must be at least the receiver’s level error, ${levelErrorDb} dB`
		});
	}
	return issues;
}
