import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondJson } from '$lib/server/respond';
import { abandonAttempt } from '$lib/server/services/attempts/abandon-attempt';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return abandonAttempt(actor, readId(params.id, 'attempt'), new Date());
	});
