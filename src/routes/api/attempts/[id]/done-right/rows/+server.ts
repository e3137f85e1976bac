import { stepQuery } from '$lib/schemas/done-right';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { parseWith } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { streamDoneRightRows } from '$lib/server/services/attempts/stream-done-right-rows';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params, url }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		const { step } = parseWith(stepQuery, Object.fromEntries(url.searchParams));
		return new Response(await streamDoneRightRows(actor, attemptId, step), {
			headers: { 'content-type': 'application/octet-stream', 'cache-control': 'no-store' }
		});
	});
