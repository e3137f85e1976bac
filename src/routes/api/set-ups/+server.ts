import { saveSetUpRequest } from '$lib/schemas/saved-set-up';
import { requireActor } from '$lib/server/auth/require-actor';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { listSavedSetUps } from '$lib/server/services/set-ups/list-saved-set-ups';
import { saveSetUp } from '$lib/server/services/set-ups/save-set-up';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals }) => respondJson(() => listSavedSetUps(requireActor(locals)));

export const POST: RequestHandler = ({ locals, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return saveSetUp(actor, await readJson(request, saveSetUpRequest), new Date());
	});
