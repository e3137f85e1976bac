import type { DoneRightResponse } from '$lib/schemas/done-right';
import type { Actor } from '$lib/server/domain/role';
import { doneRightOf } from './done-right-of';

/** The steps of the taught method on a closed attempt's own signal, as a player shows them. */
export async function getDoneRight(actor: Actor, attemptId: number): Promise<DoneRightResponse> {
	const { play } = await doneRightOf(actor, attemptId);
	return { start: play.start, steps: play.steps };
}
