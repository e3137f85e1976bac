import { redirect } from '@sveltejs/kit';
import { clearSessionCookie, readSessionCookie } from '$lib/server/auth/cookies';
import { signOut } from '$lib/server/services/accounts/sign-out';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = async ({ cookies, locals }) => {
	await signOut(readSessionCookie(cookies, locals.secureCookies));
	clearSessionCookie(cookies, locals.secureCookies);
	redirect(303, '/');
};
