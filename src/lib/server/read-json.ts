import type { z } from 'zod';
import { DomainError } from './errors';

/**
 * The request's JSON body, checked against `schema`.
 * Throws DomainError: `malformed` when it isn't JSON, `invalid` with one issue for each field that is wrong.
 */
export async function readJson<S extends z.ZodType>(request: Request, schema: S): Promise<z.output<S>> {
	let body: unknown;
	try {
		body = JSON.parse(await request.text());
	} catch (cause) {
		if (!(cause instanceof SyntaxError)) throw cause;
		throw new DomainError('malformed', 'The body must be JSON.');
	}
	return parseWith(schema, body);
}

/** `value` checked against `schema`. Throws DomainError `invalid` with one issue for each field that is wrong. */
export function parseWith<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
	const parsed = schema.safeParse(value);
	if (parsed.success) return parsed.data;
	const issues = parsed.error.issues.map(({ path, message }) => ({ field: path.join('.'), message }));
	throw new DomainError('invalid', 'Some of what was sent is not right.', { issues });
}
