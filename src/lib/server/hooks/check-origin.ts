import type { Handle } from '@sveltejs/kit';
import { refusedOrigin } from '$lib/server/domain/request-origin';
import { refusalPage } from './refusal-page';

/** Paths that other servers post to, and that check a signature instead. None yet. */
const EXEMPT: readonly string[] = [];

/**
 * Refuses every request that could change something unless one of our own pages sent it, whatever its content type:
 * a foreign page can send a browser's cookies along with a form, or with a body that has no type at all.
 */
export const checkOrigin: Handle = ({ event, resolve }) => {
	const { request, url, locals } = event;
	if (EXEMPT.includes(url.pathname)) return resolve(event);
	const refused = refusedOrigin(
		{
			method: request.method,
			origin: request.headers.get('origin'),
			fetchSite: request.headers.get('sec-fetch-site')
		},
		locals.origin
	);
	return refused ? refusalPage(request, 403, refused) : resolve(event);
};
