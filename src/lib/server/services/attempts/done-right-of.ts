import { playDoneRight, type PlayedExercise } from '$lib/server/bench/grading/done-right';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getAttempt } from './get-attempt';
import { LeastRecentlyUsed } from '../process/least-recently-used';
import { drawnFor, refuseOtherEngine, type SignalSource } from './prepared-bench';
import { exerciseOf, signalSource } from './signal-source';

// Only a cache: a player asks for the steps once and for their rows several times.
const played = new LeastRecentlyUsed<string, PlayedExercise>(32);

/**
 * The taught method on a closed attempt's own signal.
 * @throws DomainError `conflict` while the attempt is open, and when its sweeps can't be made again; `forbidden` for whoever
 *   may see the attempt but no truths
 */
export async function doneRightOf(
	actor: Actor,
	attemptId: number
): Promise<{ source: SignalSource; play: PlayedExercise }> {
	const attempt = await getAttempt(actor, 'attempt.read', attemptId);
	if (!attempt.closedAt) throw new DomainError('conflict', 'This attempt has not been handed in yet.');
	if (!may(actor, 'answer-key.read', { ownerId: attempt.userId, closed: true })) {
		throw new DomainError('forbidden', 'What the signal was is not for your role to see.');
	}
	const source = signalSource(attempt, await exerciseOf(attempt));
	refuseOtherEngine(source);
	return { source, play: played.get(source.seed, () => playDoneRight(drawnFor(source))) };
}
