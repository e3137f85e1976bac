import type { z } from 'zod';
import { DomainError } from './errors';

/** Little JSON that the site asks for comes near this. */
const MAX_BODY_BYTES = 64 * 1024;
/** For what holds a whole file of a course. */
export const FILE_BODY_BYTES = 512 * 1024;

/**
 * The request's JSON body, checked against `schema`.
 * Throws DomainError: `malformed` when it isn't JSON, isn't called so or is longer than `maxBytes`, `invalid` with one issue for
 * each field that is wrong.
 */
export async function readJson<S extends z.ZodType>(
	request: Request,
	schema: S,
	maxBytes = MAX_BODY_BYTES
): Promise<z.output<S>> {
	if (!/^application\/json\s*(;|$)/i.test(request.headers.get('content-type') ?? ''))
		throw new DomainError('malformed', 'The body must be JSON, and its content-type application/json.');
	let body: unknown;
	try {
		body = JSON.parse((await readBytes(request, maxBytes)).toString('utf8'));
	} catch (cause) {
		if (!(cause instanceof SyntaxError)) throw cause;
		throw new DomainError('malformed', 'The body must be JSON.');
	}
	return parseWith(schema, body);
}

/** The request's body. Gives up at the limit, whatever length the request claims, so that nobody fills the memory. */
export async function readBytes(request: Request, maxBytes: number): Promise<Buffer> {
	const chunks: Uint8Array[] = [];
	let bytes = 0;
	for await (const chunk of request.body ?? []) {
		bytes += chunk.byteLength;
		if (bytes > maxBytes)
			throw new DomainError('malformed', `The body is longer than ${Math.round(maxBytes / 1024)} kB.`);
		chunks.push(chunk);
	}
	return Buffer.concat(chunks);
}

/** `value` checked against `schema`. Throws DomainError `invalid` with one issue for each field that is wrong. */
export function parseWith<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
	const parsed = schema.safeParse(value);
	if (parsed.success) return parsed.data;
	const issues = parsed.error.issues.flatMap((issue) =>
		issue.code === 'unrecognized_keys'
			? issue.keys.map((key) => ({
					field: [...issue.path, key].join('.'),
					message: 'nothing of this name is asked for'
				}))
			: [{ field: issue.path.join('.'), message: issue.message }]
	);
	throw new DomainError('invalid', 'Some of what was sent is not right.', { issues });
}
