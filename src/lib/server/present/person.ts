import type { PersonView } from '$lib/schemas/person';
import { roleName, type Actor } from '$lib/server/domain/role';
import { roomsOf } from '$lib/server/domain/rooms';

/** Whoever is signed in, as their own pages show them. */
export function presentPerson(actor: Actor, user: { displayName: string; email: string }): PersonView {
	return {
		displayName: user.displayName,
		email: user.email,
		roles: actor.roles.map(roleName),
		rooms: roomsOf(actor).map(({ label, href }) => ({ label, href }))
	};
}
