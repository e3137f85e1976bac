import type { z } from 'zod';
import type { ExerciseIssue } from './exercise-error';

/** "scene.emitters[0].levelDbm" from a path. */
export const fieldOf = (path: readonly PropertyKey[]): string =>
	path.reduce<string>((field, key) => {
		if (typeof key === 'number') return `${field}[${key}]`;
		return field ? `${field}.${String(key)}` : String(key);
	}, '');

/** A path from "scene.emitters[0].levelDbm". */
export const pathOf = (field: string): (string | number)[] =>
	[...field.matchAll(/([^.[\]]+)|\[(\d+)\]/g)].map(([, key, index]) => key ?? Number(index));

/** Issues by field; an unknown key is named in the field itself. */
export function issuesOf(error: z.ZodError, prefix = ''): ExerciseIssue[] {
	return error.issues.flatMap((issue) => {
		const field = [prefix, fieldOf(issue.path)].filter(Boolean).join('.').replace(/\.\[/g, '[');
		if (issue.code !== 'unrecognized_keys') return [{ field: field || '(file)', message: issue.message }];
		return issue.keys.map((key) => ({ field: field ? `${field}.${key}` : key, message: 'unknown here' }));
	});
}
