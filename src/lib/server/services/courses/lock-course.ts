import type { Transaction } from 'sequelize';
import { Course } from '$lib/server/db/models/course';
import { Edition } from '$lib/server/db/models/edition';

/** The course's row, made if need be and locked: whoever else publishes this course waits here. */
export async function lockedCourse(slug: string, now: Date, transaction: Transaction): Promise<Course> {
	// An update in place of INSERT IGNORE, which would take a lesser lock first and two processes into a deadlock.
	await Course.bulkCreate([{ slug, createdAt: now }], { updateOnDuplicate: ['slug'], transaction });
	const course = await Course.findOne({ where: { slug }, lock: transaction.LOCK.UPDATE, transaction });
	if (!course) throw new Error(`The course ${slug} was made and is not there`);
	return course;
}

export const newestEdition = (courseId: number, transaction?: Transaction): Promise<Edition | null> =>
	Edition.findOne({ where: { courseId }, order: [['number', 'DESC']], transaction });
