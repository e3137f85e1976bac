import { hashPassword } from '$lib/server/auth/passwords';
import { User } from '$lib/server/db/models/user';
import { UserRole } from '$lib/server/db/models/user-role';
import type { Actor, Role } from '$lib/server/domain/role';

let made = 0;

export const PASSWORD = 'correct-horse-battery';

/** A person with these roles, in the database; nobody else has their address. */
export async function createUser(...held: Role[]): Promise<{ user: User; actor: Actor }> {
	made += 1;
	const user = await User.create({
		email: `person-${made}@tarnvale.example`,
		displayName: `Person ${made}`,
		passwordHash: await hashPassword(PASSWORD)
	});
	for (const role of held) await UserRole.create({ userId: user.id, role });
	return { user, actor: { id: user.id, roles: held } };
}
