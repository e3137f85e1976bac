import { presenceRequest } from '$lib/schemas/desk';
import { requireActor } from '$lib/server/auth/require-actor';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { notePresence } from '$lib/server/services/course-drafts/note-presence';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const { path } = await readJson(request, presenceRequest);
		return notePresence(actor, params.course, path, new Date());
	});
