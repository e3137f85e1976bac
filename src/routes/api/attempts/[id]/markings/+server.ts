import { markingsRequest } from '$lib/schemas/markings';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { saveMarkings } from '$lib/server/services/attempts/save-markings';
import type { RequestHandler } from './$types';

export const PUT: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		return saveMarkings(actor, attemptId, await readJson(request, markingsRequest), new Date());
	});
