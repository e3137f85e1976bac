import { DomainError } from './errors';

/**
 * An id out of a URL: a whole number from 1.
 * @param what it is the id of, in words
 * Throws DomainError `not_found` for anything else, as for an id that nothing has.
 */
export function readId(text: string, what: string): number {
	const id = /^[1-9]\d{0,15}$/.test(text) ? Number(text) : NaN;
	if (!Number.isSafeInteger(id)) throw new DomainError('not_found', `There is no such ${what}.`);
	return id;
}
