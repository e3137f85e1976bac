import type { z } from 'zod';
import { BenchError } from '../bench-error';
import { issuesOf } from '../exercise/zod-issues';

/** Input by its schema. @throws BenchError with the first field that is wrong */
export function parseInput<T>(schema: z.ZodType<T>, input: unknown): T {
	const parsed = schema.safeParse(input);
	if (parsed.success) return parsed.data;
	const { field, message } = issuesOf(parsed.error)[0];
	throw new BenchError(field, message);
}
