import { redirect } from '@sveltejs/kit';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/** For pages and form actions: who asks, or a redirection to the sign-in page and back from there. */
export function requireUser(event: { locals: App.Locals; url: URL }): Actor {
	const { actor } = event.locals;
	if (!actor) redirect(303, `/sign-in?next=${encodeURIComponent(event.url.pathname + event.url.search)}`);
	return actor;
}

/** For endpoints: who asks. Throws DomainError `unauthenticated` if nobody is signed in. */
export function requireActor(locals: App.Locals): Actor {
	if (!locals.actor) throw new DomainError('unauthenticated', 'Sign in first.');
	return locals.actor;
}
