import type { WrittenSetUp } from '$lib/schemas/questions/set-up';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import { conditionId } from './condition-id';

/** Conditions and mistakes have names of their own, and a mistake breaks conditions that stand. */
export function checkSetUp({ conditions, mistakes }: WrittenSetUp, field: string): ExerciseIssue[] {
	const names = conditions.map(conditionId);
	const twice = names.flatMap((name, i) =>
		names.indexOf(name) === i
			? []
			: [{ field: `${field}.conditions[${i}].id`, message: `${name} stands twice: give it an id of its own` }]
	);
	return [
		...twice,
		...mistakes.flatMap(({ id, breaks }, i) => {
			const place = `${field}.mistakes[${i}]`;
			const first = mistakes.findIndex((other) => other.id === id);
			return [
				...(first === i ? [] : [{ field: `${place}.id`, message: `${id} stands twice` }]),
				...breaks
					.filter((name) => !names.includes(name))
					.map((name) => ({
						field: `${place}.breaks`,
						message: `no condition is called ${name}: ${names.join(', ')}`
					}))
			];
		})
	];
}
