import type { Handle } from '@sveltejs/kit';

/** Writes the colour scheme that was chosen into the page, so that it never shows in the other one first. */
export const chooseScheme: Handle = ({ event, resolve }) => {
	const chosen = event.cookies.get('scheme');
	const scheme = chosen === 'day' || chosen === 'night' ? chosen : 'system';
	return resolve(event, { transformPageChunk: ({ html }) => html.replace('%scheme%', scheme) });
};
