import type { z } from 'zod';
import { ExerciseError } from './exercise-error';
import type { Scope } from './expression';
import { fillTemplate } from './fill-template';
import { issuesOf } from './zod-issues';

/** A template filled in and checked against the schema it stands for. @throws ExerciseError by field */
export function filled<T>(schema: z.ZodType<T>, template: unknown, scope: Scope, field: string): T {
	const parsed = schema.safeParse(fillTemplate(template, scope, field));
	if (!parsed.success) throw new ExerciseError(issuesOf(parsed.error, field));
	return parsed.data;
}
