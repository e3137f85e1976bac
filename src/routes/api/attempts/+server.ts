import { startAttemptRequest } from '$lib/schemas/attempt';
import { requireActor } from '$lib/server/auth/require-actor';
import { readJson } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { json } from '@sveltejs/kit';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, request }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const { exercise, practice } = await readJson(request, startAttemptRequest);
		const { attempt, created } = await startAttempt(actor, exercise, new Date(), practice);
		return json({ attempt }, { status: created ? 201 : 200 });
	});
