import { mostSavedSetUps, type SaveSetUpRequest, type SaveSetUpResponse } from '$lib/schemas/saved-set-up';
import { SavedSetUp } from '$lib/server/db/models/saved-set-up';
import { User } from '$lib/server/db/models/user';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentSavedSetUp } from '$lib/server/present/saved-set-up';
import { refuseStrangers } from './refuse-strangers';

/** A set-up in JSON is a few hundred characters, with a long correction table some thousands. */
const MOST_CHARACTERS = 16_384;

/**
 * Keeps a set-up under a name, in place of one of the same name. Whether a receiver can do it is found out when it is recalled.
 * @throws DomainError `invalid` naming `settings` when it is too long; `conflict` when this person has as many as may be kept
 */
export async function saveSetUp(
	actor: Actor,
	{ name, settings }: SaveSetUpRequest,
	now: Date
): Promise<SaveSetUpResponse> {
	refuseStrangers(actor);
	if (JSON.stringify(settings).length > MOST_CHARACTERS) {
		const message = 'must not be longer than 16 kB; shorten the correction table';
		throw new DomainError('invalid', 'This set-up is too long to keep.', {
			issues: [{ field: 'settings', message }]
		});
	}
	return inTransaction(async (transaction) => {
		// One saving at a time for each person, so that the limit holds.
		await User.findByPk(actor.id, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
		const where = { userId: actor.id, name };
		const before = await SavedSetUp.findOne({ where, transaction });
		if (before) {
			await before.update({ name, settings, savedAt: now }, { transaction });
			return { setUp: presentSavedSetUp(before), replaced: true };
		}
		if ((await SavedSetUp.count({ where: { userId: actor.id }, transaction })) >= mostSavedSetUps) {
			throw new DomainError(
				'conflict',
				`You have ${mostSavedSetUps} saved set-ups, as many as are kept. Remove one first.`
			);
		}
		const saved = await SavedSetUp.create({ ...where, settings, savedAt: now }, { transaction });
		return { setUp: presentSavedSetUp(saved), replaced: false };
	});
}
