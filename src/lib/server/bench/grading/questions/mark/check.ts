import type { WrittenMark } from '$lib/schemas/questions/mark';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';

/** A flag's tolerance is in Hz; mistakes have names of their own and the question's shape. */
export function checkMark({ shape, tolerance, mistakes }: WrittenMark, field: string): ExerciseIssue[] {
	const issues: ExerciseIssue[] = [];
	if (shape === 'flag' && 'relative' in tolerance) {
		issues.push({ field: `${field}.tolerance`, message: 'a flag’s tolerance is absolute, in Hz' });
	}
	mistakes.forEach(({ id, toHz }, i) => {
		const place = `${field}.mistakes[${i}]`;
		if (mistakes.findIndex((other) => other.id === id) !== i)
			issues.push({ field: `${place}.id`, message: `${id} stands twice` });
		if ((toHz !== undefined) !== (shape === 'band'))
			issues.push({
				field: `${place}.toHz`,
				message: shape === 'band' ? 'a band has two edges' : 'a flag has one place'
			});
	});
	return issues;
}
