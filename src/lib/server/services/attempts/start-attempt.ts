import { randomBytes } from 'node:crypto';
import type { AttemptView } from '$lib/schemas/attempt';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import { Attempt } from '$lib/server/db/models/attempt';
import { User } from '$lib/server/db/models/user';
import { attemptsAtExercise, type AttemptLine } from '$lib/server/db/queries/attempts-at-exercise';
import { findPublishedExercise } from '$lib/server/db/queries/find-exercise';
import { inTransaction } from '$lib/server/db/transaction';
import { may } from '$lib/server/domain/policy';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { triesLeft } from '$lib/server/present/progress';
import { findLocks } from '../progress/find-locks';
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
 * Practice is for what is right or has no try left: it takes none and never counts.
 * @throws DomainError `not_found` for an exercise that isn't published; `conflict` when its unit is still shut, when the tries
 *   are used up, and for practice while an attempt could still count
 */
export async function startAttempt(
	actor: Actor,
	exerciseSlug: string,
	now: Date,
	practice = false
): Promise<StartedAttempt> {
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
		const lock = (await findLocks(actor, exercise.edition, transaction)).get(exercise.unit.slug);
		if (lock) throw new DomainError('conflict', lock.text);
		refuseWrongKind(exercise, earlier, practice);
		const attempt = await Attempt.create(
			{
				userId: actor.id,
				editionId: exercise.editionId,
				exerciseId: exercise.id,
				number: earlier.length + 1,
				practice,
				seed: randomBytes(16).toString('hex'),
				engineVersion: ENGINE_VERSION,
				startedAt: now
			},
			{ transaction }
		);
		return { attempt: await viewAttempt(attempt, transaction), created: true };
	});
}

function refuseWrongKind({ tries }: { tries: number }, earlier: AttemptLine[], practice: boolean): void {
	const left = triesLeft({ tries }, earlier);
	if (practice && left > 0 && !earlier.some(({ passed }) => passed === 1)) {
		throw new DomainError('conflict', 'Practice comes when the exercise is right or its tries are used.');
	}
	if (!practice && left === 0) {
		const used =
			tries === 1 ? 'The one try at this exercise has' : `All ${tries} tries at this exercise have`;
		throw new DomainError('conflict', `${used} been used. What follows is practice.`);
	}
}
