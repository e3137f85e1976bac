import { sweepsRequest } from '$lib/schemas/sweep-stream';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { streamSweeps } from '$lib/server/services/attempts/stream-sweeps';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const attemptId = readId(params.id, 'attempt');
		const frames = await streamSweeps(actor, attemptId, await readJson(request, sweepsRequest), new Date());
		return new Response(frames, {
			// A proxy that gathered the rows first would make the bench stutter.
			headers: {
				'content-type': 'application/octet-stream',
				'cache-control': 'no-store',
				'x-accel-buffering': 'no'
			}
		});
	});
