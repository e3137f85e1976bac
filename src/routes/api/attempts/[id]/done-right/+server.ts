import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondJson } from '$lib/server/respond';
import { getDoneRight } from '$lib/server/services/attempts/get-done-right';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return getDoneRight(actor, readId(params.id, 'attempt'));
	});
