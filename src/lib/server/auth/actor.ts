import { roles, type Actor } from '$lib/server/domain/role';

/** The policy's view of a user record: roles in the policy's order, words that it doesn't know left out. */
export const actorOf = (user: { id: number; roles: readonly string[] }): Actor => ({
	id: user.id,
	roles: roles.filter((role) => user.roles.includes(role))
});
