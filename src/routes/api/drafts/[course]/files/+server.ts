import { saveFileRequest } from '$lib/schemas/desk';
import { requireActor } from '$lib/server/auth/require-actor';
import { FILE_BODY_BYTES, readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { saveDraftFile } from '$lib/server/services/course-drafts/save-draft-file';
import type { RequestHandler } from './$types';

export const PUT: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const asked = await readJson(request, saveFileRequest, FILE_BODY_BYTES);
		return saveDraftFile(actor, params.course, asked, new Date());
	});
