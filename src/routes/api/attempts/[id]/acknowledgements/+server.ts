import { acknowledgementRequest } from '$lib/schemas/sweep-stream';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		return acknowledgeRows(actor, attemptId, await readJson(request, acknowledgementRequest));
	});
