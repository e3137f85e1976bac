import { DomainError } from '$lib/server/errors';
import { may, type Action, type Resource } from './policy';
import type { Actor } from './role';

/**
 * Goes on where the policy lets `actor` do `action`.
 * @param message why not, where more can be said than that it is not for this role
 * @throws DomainError `forbidden`
 */
export function refuseUnless(
	actor: Actor,
	action: Action,
	{
		resource,
		message = 'This part of the site is not for your role.'
	}: { resource?: Resource; message?: string } = {}
): void {
	if (!may(actor, action, resource)) throw new DomainError('forbidden', message);
}
