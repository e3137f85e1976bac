import type { HandleServerError } from '@sveltejs/kit';
import { randomUUID } from 'node:crypto';

/** Logs what went wrong as one line of JSON under an id, and shows the id and none of the cause. */
export const reportError: HandleServerError = ({ error, event, status, message }) => {
	if (status < 500) return { message: status === 404 ? 'There is no such page.' : message };
	const id = randomUUID();
	const cause = error instanceof Error ? (error.stack ?? error.message) : String(error);
	console.error(
		JSON.stringify({
			at: new Date().toISOString(),
			id,
			method: event.request.method,
			route: event.route.id,
			path: event.url.pathname,
			actorId: event.locals.actor?.id,
			cause
		})
	);
	return { message: 'Something went wrong on our side. It has been noted.', id };
};
