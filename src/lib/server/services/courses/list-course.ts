import type { CourseProgress } from '$lib/schemas/course-view';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { listAttempts } from '$lib/server/db/queries/attempts-at-exercise';
import { newestEditions, type PublishedCourse } from '$lib/server/db/queries/newest-editions';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentProgress } from '$lib/server/present/progress';
import { findLocks } from '../progress/find-locks';

/** Every course as published now, with what this person has done in it. */
export async function listCourses(actor: Actor, now: Date): Promise<CourseProgress[]> {
	refuseUnless(actor, 'learn.enter');
	return Promise.all((await newestEditions()).map((course) => courseWithProgress(actor, course, now)));
}

/** One course as published now, with what this person has done in it. @throws DomainError `not_found` */
export async function listCourse(actor: Actor, slug: string, now: Date): Promise<CourseProgress> {
	refuseUnless(actor, 'learn.enter');
	const course = (await newestEditions()).find((candidate) => candidate.slug === slug);
	if (!course) throw new DomainError('not_found', 'There is no such course.');
	return courseWithProgress(actor, course, now);
}

async function courseWithProgress(actor: Actor, course: PublishedCourse, now: Date): Promise<CourseProgress> {
	const { courseId, editionId, slug, edition, title, summary } = course;
	const units = await Unit.findAll({
		where: { editionId },
		attributes: ['id', 'number', 'slug', 'title', 'summary'],
		order: [['number', 'ASC']]
	});
	const exercises = await Exercise.findAll({
		where: { editionId },
		attributes: ['unitId', 'number', 'slug', 'title', 'tries'],
		order: [['number', 'ASC']]
	});
	const attempts = groupedBy(await listAttempts(actor.id, courseId, null), (line) => line.exerciseSlug);
	const locks = await findLocks(actor, { id: editionId, courseId });
	const inUnit = groupedBy(exercises, (exercise) => exercise.unitId);
	return {
		slug,
		title,
		summary,
		edition,
		units: units.map((unit) => ({
			number: unit.number,
			slug: unit.slug,
			title: unit.title,
			summary: unit.summary,
			lock: locks.get(unit.slug) ?? null,
			exercises: (inUnit.get(unit.id) ?? []).map((exercise) =>
				presentProgress(exercise, attempts.get(exercise.slug) ?? [], now)
			)
		}))
	};
}

function groupedBy<T, K>(items: T[], keyOf: (item: T) => K): Map<K, T[]> {
	const groups = new Map<K, T[]>();
	for (const item of items) groups.set(keyOf(item), [...(groups.get(keyOf(item)) ?? []), item]);
	return groups;
}
