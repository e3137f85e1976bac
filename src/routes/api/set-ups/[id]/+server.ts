import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondWith } from '$lib/server/respond';
import { removeSetUp } from '$lib/server/services/set-ups/remove-set-up';
import type { RequestHandler } from './$types';

export const DELETE: RequestHandler = ({ locals, params }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		await removeSetUp(actor, readId(params.id, 'set-up'));
		return new Response(null, { status: 204 });
	});
