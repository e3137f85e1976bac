import { answersRequest } from '$lib/schemas/attempt';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { handIn } from '$lib/server/services/attempts/hand-in';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		return handIn(actor, attemptId, await readJson(request, answersRequest), new Date());
	});
