import { fileQuery } from '$lib/schemas/desk';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { parseWith } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { getFileVersion } from '$lib/server/services/course-drafts/list-file-versions';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params, url }) =>
	respondJson(() => {
		const actor = requireActor(locals);
		const { path } = parseWith(fileQuery, Object.fromEntries(url.searchParams));
		return getFileVersion(actor, params.course, path, readId(params.id, 'version'));
	});
