import { rowsQuery } from '$lib/schemas/sweep-stream';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { parseWith } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { streamRows } from '$lib/server/services/attempts/stream-rows';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params, url }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		const frames = await streamRows(
			actor,
			attemptId,
			parseWith(rowsQuery, Object.fromEntries(url.searchParams))
		);
		return new Response(frames, {
			headers: { 'content-type': 'application/octet-stream', 'cache-control': 'no-store' }
		});
	});
