import type { Handle } from '@sveltejs/kit';
import { clearSessionCookie, readSessionCookie, setSessionCookie } from '$lib/server/auth/cookies';
import { identify } from '$lib/server/services/accounts/identify';

/** Finds out who is asking, from the session cookie, and decides nothing. */
export const resolveSession: Handle = async ({ event, resolve }) => {
	const { cookies, locals } = event;
	locals.actor = null;
	locals.person = null;
	const token = readSessionCookie(cookies, locals.secureCookies);
	if (token !== undefined) {
		const identified = await identify(token);
		if (identified) {
			locals.actor = identified.actor;
			locals.person = identified.person;
			if (identified.renewed) setSessionCookie(cookies, locals.secureCookies, token, identified.expiresAt);
		} else {
			clearSessionCookie(cookies, locals.secureCookies);
		}
	}
	return resolve(event);
};
