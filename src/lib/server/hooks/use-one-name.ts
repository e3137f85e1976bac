import type { Handle } from '@sveltejs/kit';
import { properOrigin } from '$lib/server/domain/loopback-name';

/** Sends a page asked for as localhost to the address that forms are accepted from, or the other way round. */
export const useOneName: Handle = ({ event, resolve }) => {
	const { request, url, locals } = event;
	if (request.method !== 'GET' && request.method !== 'HEAD') return resolve(event);
	const proper = properOrigin(request.headers.get('host'), locals.origin);
	if (!proper) return resolve(event);
	const location = `${proper}${url.pathname}${url.search}`;
	return new Response(null, { status: 307, headers: { location } });
};
