import { Attempt } from '$lib/server/db/models/attempt';
import type { StreamEndReason } from '$lib/schemas/sweep-stream';
import type { BenchPosition } from './advance-bench';

/**
 * Moves the attempt from `before` to `after` on behalf of one stream, in one statement that locks its row:
 * of two streams only the one whose token stands there moves it, so no row is ever swept twice with different settings.
 * @returns null when it moved, else why this stream is over
 */
export async function reserveSweep(
	attemptId: number,
	streamToken: string,
	before: BenchPosition,
	after: BenchPosition
): Promise<StreamEndReason | null> {
	const where = { id: attemptId, streamToken, closedAt: null, nextRow: before.nextRow };
	const [moved] = await Attempt.update({ ...after }, { where });
	if (moved === 1) return null;
	const attempt = await Attempt.findByPk(attemptId, { attributes: ['closedAt'] });
	return attempt?.closedAt ? 'closed' : 'taken-over';
}
