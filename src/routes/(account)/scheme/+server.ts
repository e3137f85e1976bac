import { redirect } from '@sveltejs/kit';
import { schemeForm } from '$lib/schemas/scheme';
import { readForm } from '$lib/server/read-form';
import { parseWith } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { destinationBack } from '$lib/server/services/accounts/destination';
import type { RequestHandler } from './$types';

const YEAR_S = 365 * 24 * 3600;

/** Keeps the colour scheme that was chosen. The page's script writes the same cookie, so it can't be HttpOnly. */
export const POST: RequestHandler = ({ cookies, locals, request }) =>
	respondWith(async () => {
		const { scheme, next } = parseWith(schemeForm, await readForm(request));
		cookies.set('scheme', scheme, {
			path: '/',
			maxAge: YEAR_S,
			sameSite: 'lax',
			httpOnly: false,
			secure: locals.secureCookies
		});
		redirect(303, destinationBack(next));
	});
