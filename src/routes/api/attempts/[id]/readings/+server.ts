import { takeReadingRequest } from '$lib/schemas/attempt';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		return takeReading(actor, attemptId, await readJson(request, takeReadingRequest), new Date());
	}, 201);
