const LEAST_CHARACTERS = 12;
const LEAST_DIFFERENT = 5;

/**
 * Why `password` can't be this person's, as a sentence; null if it can.
 * Length counts for more than signs and figures (common practice since NIST SP 800-63B, from memory).
 */
export function refusedPassword(
	password: string,
	person: { email: string; displayName: string }
): string | null {
	const characters = [...password];
	if (characters.length < LEAST_CHARACTERS)
		return `Use at least ${LEAST_CHARACTERS} characters; this has ${characters.length}.`;
	if (new Set(characters).size < LEAST_DIFFERENT)
		return `Use at least ${LEAST_DIFFERENT} different characters.`;
	const folded = password.toLowerCase();
	const own = [person.email, person.email.split('@')[0], person.displayName];
	if (own.some((word) => word.length > 3 && folded.includes(word.toLowerCase())))
		return 'Leave your name and your e-mail address out of it.';
	return null;
}
