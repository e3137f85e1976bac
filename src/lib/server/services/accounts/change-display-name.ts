import { User } from '$lib/server/db/models/user';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/** Gives this person another name to be shown under; how a name may look, `displayNameForm` has checked. */
export async function changeDisplayName(actor: Actor, displayName: string): Promise<void> {
	if (!may(actor, 'profile.change', { ownerId: actor.id }))
		throw new DomainError('forbidden', 'This account is not yours.');
	await User.update({ displayName }, { where: { id: actor.id } });
}
