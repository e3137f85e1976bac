import { DomainError } from './errors';

/** Forms here are short. */
const MOST_FORM_BYTES = 256 * 1024;

/** The fields of a form that was sent, the last of each name. Throws DomainError `malformed` if there is no form, or one too long. */
export async function readForm(request: Request): Promise<Record<string, FormDataEntryValue>> {
	if (Number(request.headers.get('content-length') ?? 0) > MOST_FORM_BYTES)
		throw new DomainError('malformed', 'The form is longer than 256 kB.');
	try {
		return Object.fromEntries(await request.formData());
	} catch (cause) {
		// What the platform throws for a body of another type, or one that breaks off.
		if (!(cause instanceof TypeError)) throw cause;
		throw new DomainError('malformed', 'A form was expected.');
	}
}
