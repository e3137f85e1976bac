import { may, type Action } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/** Lets this person into a room of the site. Throws DomainError `forbidden` where the policy doesn't. */
export function enterRoom(actor: Actor, enter: Extract<Action, `${string}.enter`>): void {
	if (!may(actor, enter)) throw new DomainError('forbidden', 'This part of the site is not for your role.');
}
