import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';

/** @throws DomainError `forbidden` for a role that has no bench */
export const refuseStrangers = (actor: Actor): void =>
	refuseUnless(actor, 'logbook.keep', {
		resource: { ownerId: actor.id },
		message: 'A logbook is kept by whoever has a bench.'
	});
