import { json } from '@sveltejs/kit';
import { keepRequest } from '$lib/schemas/logbook';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { keepInLogbook } from '$lib/server/services/logbook/keep-in-logbook';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		const kept = await keepInLogbook(actor, attemptId, await readJson(request, keepRequest), new Date());
		return json({ entry: kept.entry }, { status: kept.created ? 201 : 200 });
	});
