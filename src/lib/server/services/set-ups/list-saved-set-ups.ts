import type { SavedSetUpsResponse } from '$lib/schemas/saved-set-up';
import { SavedSetUp } from '$lib/server/db/models/saved-set-up';
import type { Actor } from '$lib/server/domain/role';
import { presentSavedSetUp } from '$lib/server/present/saved-set-up';
import { refuseStrangers } from './refuse-strangers';

/** This person's saved set-ups, by name. */
export async function listSavedSetUps(actor: Actor): Promise<SavedSetUpsResponse> {
	refuseStrangers(actor);
	const saved = await SavedSetUp.findAll({ where: { userId: actor.id }, order: [['name', 'ASC']] });
	return { setUps: saved.map(presentSavedSetUp) };
}
