import type { SweepsRequest } from '$lib/schemas/sweep-stream';
import type { Actor } from '$lib/server/domain/role';
import { registerStream } from './open-streams';
import { openSweeps } from './open-sweeps';
import { pulledStream } from './pulled-stream';
import { sweepFrames } from './sweep-frames';

/**
 * Sets the attempt's receiver up and sweeps: a stream of frames (schemas/frames.ts), paced to the bench clock, that ends
 * with why it ended. Refusals are thrown before the stream begins.
 */
export async function streamSweeps(
	actor: Actor,
	attemptId: number,
	request: SweepsRequest,
	now: Date
): Promise<ReadableStream<Uint8Array>> {
	const opened = await openSweeps(actor, attemptId, request, now);
	const { stopping, release } = registerStream();
	return pulledStream((gone) => sweepFrames(opened, request.sweeps ?? Infinity, { gone, stopping }), release);
}
