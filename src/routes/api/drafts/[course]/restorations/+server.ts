import { restoreRequest } from '$lib/schemas/desk';
import { requireActor } from '$lib/server/auth/require-actor';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { restoreDraftFile } from '$lib/server/services/course-drafts/save-draft-file';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return restoreDraftFile(actor, params.course, await readJson(request, restoreRequest), new Date());
	});
