import type { PersonView } from '$lib/schemas/person';
import { actorOf } from '$lib/server/auth/actor';
import { validateSession } from '$lib/server/auth/sessions';
import type { Actor } from '$lib/server/domain/role';
import { presentPerson } from '$lib/server/present/person';

export interface Identified {
	actor: Actor;
	person: PersonView;
	expiresAt: Date;
	/** True when the session's expiry has just moved: the cookie must be set anew. */
	renewed: boolean;
}

/** Who holds this session token, with their roles as they are now; null if nobody. */
export async function identify(sessionToken: string): Promise<Identified | null> {
	const signedIn = await validateSession(sessionToken);
	if (!signedIn) return null;
	const actor = actorOf(signedIn.user);
	const { expiresAt, renewed } = signedIn;
	return { actor, person: presentPerson(actor, signedIn.user), expiresAt, renewed };
}
