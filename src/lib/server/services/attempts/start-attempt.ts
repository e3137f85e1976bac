import { randomBytes } from 'node:crypto';
import type { AttemptView } from '$lib/schemas/attempt';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import { Attempt } from '$lib/server/db/models/attempt';
import { User } from '$lib/server/db/models/user';
import { attemptsAtExercise } from '$lib/server/db/queries/attempts-at-exercise';
import { findPublishedExercise } from '$lib/server/db/queries/find-exercise';
import { inTransaction } from '$lib/server/db/transaction';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getAttempt } from './get-attempt';
import { viewAttempt } from './view-attempt';

export interface StartedAttempt {
	attempt: AttemptView;
	/** False when it had been started before and is still open. */
	created: boolean;
}

/**
 * Starts an attempt at the exercise as published now, with a seed of its own, or gives back the one that is still open:
 * a try is never spent twice on one click. However many ask at once, no more than the tries allowed are ever started.
 * @throws DomainError `not_found` for an exercise that isn't published; `conflict` when the tries are used up
 */
export async function startAttempt(actor: Actor, exerciseSlug: string, now: Date): Promise<StartedAttempt> {
	if (!may(actor, 'attempt.start', { ownerId: actor.id })) {
		throw new DomainError('forbidden', 'Exercises are done by apprentices and instructors.');
	}
	return inTransaction(async (transaction) => {
		// One start at a time for each person; others don't wait.
		await User.findByPk(actor.id, { attributes: ['id'], transaction, lock: transaction.LOCK.UPDATE });
		const exercise = await findPublishedExercise(exerciseSlug, transaction);
		if (!exercise) throw new DomainError('not_found', 'There is no such exercise.');
		const earlier = await attemptsAtExercise(actor.id, exercise, transaction);
		const open = earlier.find(({ closedAt }) => closedAt === null);
		if (open) {
			const attempt = await getAttempt(actor, 'attempt.work', open.id, transaction);
			return { attempt: await viewAttempt(attempt, transaction), created: false };
		}
		if (earlier.length >= exercise.tries) {
			const { tries } = exercise;
			const used =
				tries === 1 ? 'The one try at this exercise has' : `All ${tries} tries at this exercise have`;
			throw new DomainError('conflict', `${used} been used.`);
		}
		const attempt = await Attempt.create(
			{
				userId: actor.id,
				editionId: exercise.editionId,
				exerciseId: exercise.id,
				number: earlier.length + 1,
				seed: randomBytes(16).toString('hex'),
				engineVersion: ENGINE_VERSION,
				startedAt: now
			},
			{ transaction }
		);
		return { attempt: await viewAttempt(attempt, transaction), created: true };
	});
}
