import type { Exercise as ExerciseDefinition } from '$lib/schemas/exercise';
import { Course } from '$lib/server/db/models/course';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { parseFigureText } from '$lib/server/bench/figure/parse-figure';
import { stringify } from 'yaml';
import { exerciseDefinition } from './exercise';
import { writtenFigure } from './figure';

let made = 0;
const now = new Date('2026-03-02T09:00:00Z');

/** A published course of one unit with one exercise, whose slug nobody else has. */
export async function createCourse(
	over: Partial<Record<keyof ExerciseDefinition, unknown>> = {}
): Promise<{ course: Course; exercise: Exercise }> {
	made += 1;
	const course = await Course.create({ slug: `course-${made}`, createdAt: now });
	const exercise = await createEdition(course, 1, { slug: `spread-carrier-${made}`, ...over });
	return { course, exercise };
}

/** A further edition of a course, with one exercise. */
export async function createEdition(
	course: Course,
	number: number,
	over: Partial<Record<keyof ExerciseDefinition, unknown>>
): Promise<Exercise> {
	const edition = await Edition.create({
		courseId: course.id,
		number,
		title: 'Spectrum measurement',
		summary: 'From the connector to a number.',
		contentHash: String(number).padStart(64, '0'),
		createdAt: now
	});
	const unit = await Unit.create({
		editionId: edition.id,
		number: 6,
		slug: 'power-of-a-spread-signal',
		title: 'Power of a spread signal',
		summary: 'Why a marker misleads.',
		lesson: {
			title: 'Why a marker misleads',
			words: 1,
			parts: [
				{ kind: 'text', html: '<p>Lesson.</p>' },
				{ kind: 'figure', id: 'hump' }
			]
		},
		figures: [parseFigureText(stringify(writtenFigure()))]
	});
	const definition = exerciseDefinition(over);
	return Exercise.create({
		editionId: edition.id,
		unitId: unit.id,
		number: 1,
		slug: definition.slug,
		title: definition.title,
		definition,
		situationHtml: `<p>${definition.situation}</p>`,
		tries: definition.tries
	});
}
