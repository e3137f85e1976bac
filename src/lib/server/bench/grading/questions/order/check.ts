import type { WrittenOrder } from '$lib/schemas/questions/order';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { AnswerStep } from '../question-type';
import { stepFields } from '../step-fields';

/** Items have names and texts of their own; mistakes are about two of them. */
export function checkOrder({ items, mistakes }: WrittenOrder, field: string): ExerciseIssue[] {
	const ids = items.map(({ id }) => id);
	const texts = items.map(({ text }) => text);
	return [
		...items.flatMap(({ id, text }, i) => [
			...(ids.indexOf(id) === i ? [] : [{ field: `${field}.items[${i}].id`, message: `${id} stands twice` }]),
			...(texts.indexOf(text) === i ? [] : [{ field: `${field}.items[${i}].text`, message: 'stands twice' }])
		]),
		...mistakes.flatMap((mistake, i) =>
			mistake.items
				.filter((id) => !ids.includes(id))
				.map((id) => ({ field: `${field}.mistakes[${i}].items`, message: `no item is called ${id}` }))
		)
	];
}

/** The taught method says of every item by what it is ordered. */
export function checkBy(step: AnswerStep, { items }: WrittenOrder, field: string): ExerciseIssue[] {
	const given = Object.keys(step.by ?? {});
	const ids = items.map(({ id }) => id);
	return [
		...stepFields(step, ['by'], field),
		...ids
			.filter((id) => !given.includes(id))
			.map((id) => ({ field: `${field}.by.${id}`, message: 'must be given' })),
		...given
			.filter((id) => !ids.includes(id))
			.map((id) => ({ field: `${field}.by.${id}`, message: 'no item has this id' }))
	];
}
