import type { Action } from '$lib/server/domain/policy';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';

/** Lets this person into a room of the site. Throws DomainError `forbidden` where the policy doesn't. */
export function enterRoom(actor: Actor, enter: Extract<Action, `${string}.enter`>): void {
	refuseUnless(actor, enter);
}
