import { DomainError } from './errors';

/** The fields of a form that was sent, the last of each name. Throws DomainError `malformed` if there is no form. */
export async function readForm(request: Request): Promise<Record<string, FormDataEntryValue>> {
	try {
		return Object.fromEntries(await request.formData());
	} catch (cause) {
		// What the platform throws for a body of another type, or one that breaks off.
		if (!(cause instanceof TypeError)) throw cause;
		throw new DomainError('malformed', 'A form was expected.');
	}
}
