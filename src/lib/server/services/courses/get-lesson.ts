import type { LessonPart } from '$lib/schemas/lesson';
import type { LessonPartView, LessonView } from '$lib/schemas/lesson-view';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { listAttempts } from '$lib/server/db/queries/attempts-at-exercise';
import { findPublishedUnit, type PlacedUnit } from '$lib/server/db/queries/find-unit';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { presentFigure } from '$lib/server/present/figure';
import { presentTerm } from '$lib/server/present/glossary';
import { presentProgress } from '$lib/server/present/progress';
import { firstState } from '../figures/figure-states';
import { termsIn } from './mark-terms';
import { findLocks } from '../progress/find-locks';

/** The lesson of a unit as published now, with what this person has done of its exercises. @throws DomainError `not_found` */
export async function getLesson(actor: Actor, slug: string, now: Date): Promise<LessonView> {
	refuseUnless(actor, 'lesson.read');
	const unit = await findPublishedUnit(slug);
	if (!unit) throw new DomainError('not_found', 'There is no such unit.');
	const { id, number, title, summary, lesson, edition } = unit;
	const exercises = await Exercise.findAll({
		where: { unitId: id },
		attributes: ['number', 'slug', 'title', 'tries'],
		order: [['number', 'ASC']]
	});
	const attempts = await listAttempts(actor.id, edition.courseId, null);
	return {
		course: { slug: edition.course.slug, title: edition.title },
		unit: { id, number, slug, title, summary },
		lock: (await findLocks(actor, edition)).get(slug) ?? null,
		title: lesson.title,
		words: lesson.words,
		parts: lesson.parts.map((part) => presentPart(unit, part)),
		terms: termsIn(lesson.parts).flatMap((name) => {
			const found = edition.glossary.find((term) => term.slug === name);
			return found ? [presentTerm(found)] : [];
		}),
		exercises: exercises.map((exercise) =>
			presentProgress(
				exercise,
				attempts.filter(({ exerciseSlug }) => exerciseSlug === exercise.slug),
				now
			)
		),
		...(await around(unit))
	};
}

function presentPart(unit: PlacedUnit, part: LessonPart): LessonPartView {
	if (part.kind === 'text') return part;
	const figure = unit.figures.find(({ id }) => id === part.id);
	if (!figure) throw new Error(`Unit ${unit.id} has no figure ${part.id}`);
	return { kind: 'figure', figure: presentFigure(figure, firstState({ unitId: unit.id, figure })) };
}

async function around({ editionId, id }: Unit): Promise<Pick<LessonView, 'before' | 'after'>> {
	const units = await Unit.findAll({
		where: { editionId },
		attributes: ['id', 'number', 'slug', 'title'],
		order: [['number', 'ASC']]
	});
	const at = units.findIndex((unit) => unit.id === id);
	const line = (unit: Unit | undefined) =>
		unit ? { number: unit.number, slug: unit.slug, title: unit.title } : null;
	return { before: line(units[at - 1]), after: line(units[at + 1]) };
}
