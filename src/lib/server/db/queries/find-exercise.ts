import type { Transaction } from 'sequelize';
import { Course } from '../models/course';
import { Edition } from '../models/edition';
import { Exercise } from '../models/exercise';
import { Unit } from '../models/unit';

/** An exercise with its unit, edition and course. */
export type PlacedExercise = Exercise & {
	unit: Unit;
	edition: Edition & { course: Course };
};

const place = [
	{ model: Unit, as: 'unit' },
	{ model: Edition, as: 'edition', include: [{ model: Course, as: 'course' }] }
];

/** The exercise `id`, of whatever edition. */
export async function findExercise(id: number, transaction?: Transaction): Promise<PlacedExercise | null> {
	return (await Exercise.findByPk(id, { include: place, transaction })) as PlacedExercise | null;
}

/** The exercise `slug` as published now: in the newest edition of its course, or not at all. */
export async function findPublishedExercise(
	slug: string,
	transaction?: Transaction
): Promise<PlacedExercise | null> {
	const newest = (await Exercise.findOne({
		where: { slug },
		include: place,
		order: [['id', 'DESC']],
		transaction
	})) as PlacedExercise | null;
	if (!newest) return null;
	const later = await Edition.count({
		where: { courseId: newest.edition.courseId, number: newest.edition.number + 1 },
		transaction
	});
	return later > 0 ? null : newest;
}
