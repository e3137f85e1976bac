import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/** @throws DomainError `forbidden` for a role that has no bench */
export function refuseStrangers(actor: Actor): void {
	if (!may(actor, 'logbook.keep', { ownerId: actor.id }))
		throw new DomainError('forbidden', 'A logbook is kept by whoever has a bench.');
}
