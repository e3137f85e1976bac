import type { WrittenChoice } from '$lib/schemas/questions/choice';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { AnswerStep } from '../question-type';
import { stepFields } from '../step-fields';

/** Options have names and texts of their own. */
export function checkChoice({ options }: WrittenChoice, field: string): ExerciseIssue[] {
	return options.flatMap(({ id, text }, i) => {
		const issues: ExerciseIssue[] = [];
		const place = `${field}.options[${i}]`;
		const earlier = options.slice(0, i);
		if (earlier.some((other) => other.id === id))
			issues.push({ field: `${place}.id`, message: `${id} stands twice` });
		if (earlier.some((other) => other.text === text))
			issues.push({ field: `${place}.text`, message: 'is offered twice' });
		return issues;
	});
}

/** The taught method says of options that exist whether they are chosen. */
export function checkChosen(step: AnswerStep, { options }: WrittenChoice, field: string): ExerciseIssue[] {
	const strangers = Object.keys(step.chosen ?? {}).filter(
		(id) => !options.some((option) => option.id === id)
	);
	return [
		...stepFields(step, ['chosen'], field),
		...strangers.map((id) => ({ field: `${field}.chosen.${id}`, message: 'no option has this id' }))
	];
}
