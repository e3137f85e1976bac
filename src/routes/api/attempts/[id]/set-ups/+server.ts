import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondJson } from '$lib/server/respond';
import { listSetUps } from '$lib/server/services/attempts/list-set-ups';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return listSetUps(actor, readId(params.id, 'attempt'));
	});
