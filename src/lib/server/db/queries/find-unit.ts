import type { Transaction } from 'sequelize';
import { Course } from '../models/course';
import { Edition } from '../models/edition';
import { Unit } from '../models/unit';

/** A unit with its edition and course. */
export type PlacedUnit = Unit & { edition: Edition & { course: Course } };

/** The unit `slug` as published now: in the newest edition of its course, or not at all. */
export async function findPublishedUnit(slug: string, transaction?: Transaction): Promise<PlacedUnit | null> {
	const newest = (await Unit.findOne({
		where: { slug },
		include: [{ model: Edition, as: 'edition', include: [{ model: Course, as: 'course' }] }],
		order: [['id', 'DESC']],
		transaction
	})) as PlacedUnit | null;
	if (!newest) return null;
	const { courseId, number } = newest.edition;
	const later = await Edition.count({ where: { courseId, number: number + 1 }, transaction });
	return later > 0 ? null : newest;
}
