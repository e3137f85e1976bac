/** What can be refused. `respond.ts` alone knows which HTTP status each becomes. */
export type DomainErrorCode =
	| 'malformed' // the request can't be read at all
	| 'unauthenticated' // nobody is signed in
	| 'forbidden' // the policy says no
	| 'not_found' // no such thing, or none that this person may know of
	| 'conflict' // right in itself, but not in the present state
	| 'invalid' // readable, but a value is wrong: `issues` names the fields
	| 'too_many'; // too often: `retryAfterS` says when to come back

/** One refused value: where, and why as a sentence. */
export interface Issue {
	field: string;
	message: string;
}

export interface DomainErrorParts {
	issues?: Issue[];
	retryAfterS?: number;
	/** More for the client beside the message, such as the state that a conflict was with. Goes out as it is. */
	details?: Record<string, unknown>;
}

/** A refusal with a reason fit to be shown. Anything else that is thrown is a bug. */
export class DomainError extends Error {
	readonly code: DomainErrorCode;
	readonly issues: Issue[] | undefined;
	readonly retryAfterS: number | undefined;
	readonly details: Record<string, unknown> | undefined;

	constructor(code: DomainErrorCode, message: string, parts: DomainErrorParts = {}) {
		super(message);
		this.name = 'DomainError';
		this.code = code;
		this.issues = parts.issues;
		this.retryAfterS = parts.retryAfterS;
		this.details = parts.details;
	}
}
