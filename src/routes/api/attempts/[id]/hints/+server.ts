import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondJson } from '$lib/server/respond';
import { revealHint } from '$lib/server/services/attempts/reveal-hint';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		return revealHint(actor, readId(params.id, 'attempt'));
	});
