import { fail, redirect } from '@sveltejs/kit';
import { signInForm } from '$lib/schemas/sign-in';
import {
	readDeviceCookie,
	readSessionCookie,
	setDeviceCookie,
	setSessionCookie
} from '$lib/server/auth/cookies';
import { readForm } from '$lib/server/read-form';
import { parseWith } from '$lib/server/read-json';
import { refusalOf } from '$lib/server/respond';
import { destinationAfterSignIn, homeFor } from '$lib/server/services/accounts/destination';
import { signIn } from '$lib/server/services/accounts/sign-in';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals, url }) => {
	const home = homeFor(locals.actor);
	if (home) redirect(303, destinationAfterSignIn(url.searchParams.get('next'), home));
};

export const actions: Actions = {
	default: async ({ cookies, getClientAddress, locals, request, setHeaders, url }) => {
		const secure = locals.secureCookies;
		let email = '';
		let result;
		try {
			const typed = await readForm(request);
			if (typeof typed.email === 'string') email = typed.email;
			const form = parseWith(signInForm, typed);
			result = await signIn(
				{
					...form,
					address: getClientAddress(),
					deviceToken: readDeviceCookie(cookies, secure),
					sessionToken: readSessionCookie(cookies, secure),
					userAgent: request.headers.get('user-agent')
				},
				new Date()
			);
		} catch (cause) {
			const { status, message, issues, retryAfterS } = refusalOf(cause);
			if (retryAfterS) setHeaders({ 'retry-after': String(retryAfterS) });
			return fail(status, { message, issues, email });
		}
		setSessionCookie(cookies, secure, result.sessionToken, result.expiresAt);
		setDeviceCookie(cookies, secure, result.deviceToken);
		redirect(303, destinationAfterSignIn(url.searchParams.get('next'), result.home));
	}
};
