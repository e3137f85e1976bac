/** What an exercise may ask: one file a type beside this one. A question that names no type asks for a number. */
import { z } from 'zod';
import { choiceQuestion } from './choice';
import { emissionsQuestion } from './emissions';
import { markQuestion } from './mark';
import { numberQuestion } from './number';
import { orderQuestion } from './order';
import { setUpQuestion } from './set-up';
import { uncertaintyQuestion } from './uncertainty';

export const questionTypes = [
	'number',
	'choice',
	'set-up',
	'mark',
	'order',
	'emissions',
	'uncertainty'
] as const;
export type QuestionTypeName = (typeof questionTypes)[number];

/** `number` in the place of a type that isn't given. */
export const withType = (value: unknown): unknown =>
	typeof value === 'object' && value !== null && !Array.isArray(value) && !('type' in value)
		? { type: 'number', ...value }
		: value;

const union = z.discriminatedUnion(
	'type',
	[
		numberQuestion,
		choiceQuestion,
		setUpQuestion,
		markQuestion,
		orderQuestion,
		emissionsQuestion,
		uncertaintyQuestion
	],
	{
		error: (issue) =>
			issue.code === 'invalid_union' ? `must be one of ${questionTypes.join(', ')}` : undefined
	}
);
export const exerciseQuestion = z.preprocess(withType, union);

export type ExerciseQuestion = z.infer<typeof union>;
export type QuestionAs<T extends QuestionTypeName> = Extract<ExerciseQuestion, { type: T }>;
