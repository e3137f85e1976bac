import { SavedSetUp } from '$lib/server/db/models/saved-set-up';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { refuseStrangers } from './refuse-strangers';

/** Removes a saved set-up. @throws DomainError `forbidden`; `not_found`, alike for one that isn't there and somebody else's */
export async function removeSetUp(actor: Actor, id: number): Promise<void> {
	refuseStrangers(actor);
	const saved = await SavedSetUp.findByPk(id);
	if (!saved || !may(actor, 'saved-set-up.keep', { ownerId: saved.userId }))
		throw new DomainError('not_found', 'There is no such set-up.');
	await saved.destroy();
}
