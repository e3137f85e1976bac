import { draftsRequest } from '$lib/schemas/attempt';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { saveDrafts } from '$lib/server/services/attempts/save-drafts';
import type { RequestHandler } from './$types';

export const PUT: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		return saveDrafts(actor, attemptId, await readJson(request, draftsRequest), new Date());
	});
