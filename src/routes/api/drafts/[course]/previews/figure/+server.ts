import { figureTurnRequest } from '$lib/schemas/preview-view';
import { requireActor } from '$lib/server/auth/require-actor';
import { FILE_BODY_BYTES, readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { turnDraftFigure } from '$lib/server/services/course-drafts/preview-file';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const asked = await readJson(request, figureTurnRequest, FILE_BODY_BYTES);
		return turnDraftFigure(actor, params.course, asked);
	});
