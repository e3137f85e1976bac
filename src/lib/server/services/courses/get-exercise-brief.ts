import type { ExerciseBrief } from '$lib/schemas/course-view';
import { profileNamed } from '$lib/server/bench/receiver/profiles';
import { attemptsAtExercise } from '$lib/server/db/queries/attempts-at-exercise';
import { findPublishedExercise } from '$lib/server/db/queries/find-exercise';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentReceiver } from '$lib/server/present/exercise';
import { presentProgress } from '$lib/server/present/progress';
import { findLocks } from '../progress/find-locks';

/** What an exercise is, before it is started: nothing that a seed decides. @throws DomainError `not_found` */
export async function getExerciseBrief(actor: Actor, slug: string, now: Date): Promise<ExerciseBrief> {
	refuseUnless(actor, 'learn.enter');
	const exercise = await findPublishedExercise(slug);
	if (!exercise) throw new DomainError('not_found', 'There is no such exercise.');
	const { unit, edition, definition } = exercise;
	const { receiver } = definition;
	return {
		course: { slug: edition.course.slug, title: edition.title },
		unit: { number: unit.number, slug: unit.slug, title: unit.title },
		lock: (await findLocks(actor, edition)).get(unit.slug) ?? null,
		exercise: presentProgress(exercise, await attemptsAtExercise(actor.id, exercise), now),
		client: definition.client,
		receiver: presentReceiver(typeof receiver === 'string' ? profileNamed(receiver) : receiver),
		questions: definition.questions.map(({ type }) => type),
		hints: definition.hints.length,
		benchTimeS: definition.benchTimeS
	};
}
