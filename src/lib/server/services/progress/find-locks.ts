import type { Transaction } from 'sequelize';
import { unitStandings } from '$lib/server/db/queries/unit-standings';
import { may } from '$lib/server/domain/policy';
import { lockOf, type Lock } from '$lib/server/domain/progress/locks';
import type { Actor } from '$lib/server/domain/role';

/** What holds the units of an edition shut for this person, by unit: nothing for those whom no need holds. */
export async function findLocks(
	actor: Actor,
	edition: { id: number; courseId: number },
	transaction?: Transaction
): Promise<Map<string, Lock>> {
	if (may(actor, 'unit.open-any')) return new Map();
	const units = await unitStandings(actor.id, edition, transaction);
	return new Map(
		units.flatMap((unit) => {
			const lock = lockOf(unit, units);
			return lock ? [[unit.slug, lock] as const] : [];
		})
	);
}
