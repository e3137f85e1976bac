import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondJson } from '$lib/server/respond';
import { getFinding } from '$lib/server/services/attempts/get-finding';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return getFinding(actor, readId(params.id, 'attempt'));
	});
