import { error, json } from '@sveltejs/kit';
import { DomainError, type DomainErrorCode, type Issue } from './errors';

const STATUS: Record<DomainErrorCode, number> = {
	malformed: 400,
	unauthenticated: 401,
	forbidden: 403,
	not_found: 404,
	conflict: 409,
	invalid: 422,
	too_many: 429
};

/** A refusal as a form action shows it beside the form. */
export interface Refusal {
	status: number;
	message: string;
	issues: Issue[];
	retryAfterS: number | undefined;
}

/** For loads: the work's result, or kit's error page with the refusal's status and message. */
export async function respond<T>(work: () => T | Promise<T>): Promise<T> {
	try {
		return await work();
	} catch (cause) {
		const refusal = refusalOf(cause);
		error(refusal.status, { message: refusal.message, issues: refusal.issues });
	}
}

/** For endpoints: the work's result as JSON with `status`, or the refusal as JSON `{message, issues?}`. */
export async function respondJson(work: () => unknown, status = 200): Promise<Response> {
	return respondWith(async () => json(await work(), { status }));
}

/** For endpoints that make their own response, such as a stream: that response, or the refusal as JSON. */
export async function respondWith(work: () => Response | Promise<Response>): Promise<Response> {
	try {
		return await work();
	} catch (cause) {
		if (!(cause instanceof DomainError)) throw cause;
		const headers: HeadersInit = cause.retryAfterS ? { 'retry-after': String(cause.retryAfterS) } : {};
		const body = { message: cause.message, issues: cause.issues, ...cause.details };
		return json(body, { status: STATUS[cause.code], headers });
	}
}

/** For form actions, which keep what was typed and show the refusal beside it. Throws on what is no refusal. */
export function refusalOf(cause: unknown): Refusal {
	if (!(cause instanceof DomainError)) throw cause;
	return {
		status: STATUS[cause.code],
		message: cause.message,
		issues: cause.issues ?? [],
		retryAfterS: cause.retryAfterS
	};
}
