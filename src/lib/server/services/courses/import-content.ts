import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import {
	coursesIn,
	hashOfCourse,
	readContent,
	type CourseContent,
	type UnitContent
} from '$lib/server/content';
import { Course } from '$lib/server/db/models/course';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { inTransaction } from '$lib/server/db/transaction';
import { checkedExercises, noteCourse, noteExercises, publishedAlready } from './checked-content';
import { renderLesson } from './render-lesson';
import { renderMarkdownTemplate } from './render-markdown';

export interface ImportedCourse {
	slug: string;
	/** The newest edition's number. */
	edition: number;
	/** False when the content is what that edition was made of already. */
	created: boolean;
}

/**
 * Publishes what stands under `root`: a new edition of every course whose content has changed since its newest one.
 * Editions that exist are never touched. Any number of processes may run it at once.
 * @throws ContentError with file, line and field at the first fault; nothing is published then
 */
export async function importContent({ root, now }: { root: string; now: Date }): Promise<ImportedCourse[]> {
	const hashes = new Map(coursesIn(root).map((folder) => [folder, hashOfCourse(root, folder)]));
	const unchanged = await publishedAlready([...hashes.values()]);
	if (unchanged) return unchanged;
	const checked = await checkedExercises();
	const courses = readContent(root, checked);
	return inTransaction(async (transaction) => {
		const imported: ImportedCourse[] = [];
		for (const course of courses) {
			const published = await importCourse(course, now, transaction);
			imported.push(published.course);
			const hash = hashes.get(course.slug) as string;
			await noteCourse(hash, published.editionId, now, transaction);
		}
		await noteExercises(checked, now, transaction);
		return imported;
	});
}

async function importCourse(
	content: CourseContent,
	now: Date,
	transaction: Transaction
): Promise<{ course: ImportedCourse; editionId: number }> {
	const course = await lockedCourse(content.slug, now, transaction);
	const newest = await Edition.findOne({
		where: { courseId: course.id },
		order: [['number', 'DESC']],
		transaction
	});
	const contentHash = createHash('sha256').update(JSON.stringify(content)).digest('hex');
	if (newest?.contentHash === contentHash) {
		const { id: editionId, number: edition } = newest;
		return { course: { slug: content.slug, edition, created: false }, editionId };
	}
	const number = (newest?.number ?? 0) + 1;
	const { title, summary } = content;
	const edition = await Edition.create(
		{ courseId: course.id, number, title, summary, contentHash, createdAt: now },
		{ transaction }
	);
	for (const unit of content.units) await createUnit(edition.id, unit, transaction);
	return { course: { slug: content.slug, edition: number, created: true }, editionId: edition.id };
}

/** The course's row, made if need be and locked: whoever else imports this course waits here. */
async function lockedCourse(slug: string, now: Date, transaction: Transaction): Promise<Course> {
	// An update in place of INSERT IGNORE, which would take a lesser lock first and two processes into a deadlock.
	await Course.bulkCreate([{ slug, createdAt: now }], { updateOnDuplicate: ['slug'], transaction });
	const course = await Course.findOne({ where: { slug }, lock: transaction.LOCK.UPDATE, transaction });
	if (!course) throw new Error(`The course ${slug} was made and is not there`);
	return course;
}

async function createUnit(editionId: number, content: UnitContent, transaction: Transaction): Promise<void> {
	const { number, slug, title, summary, lessonMarkdown, figures, exercises } = content;
	const lesson = renderLesson(
		lessonMarkdown,
		figures.map(({ id }) => id),
		title
	);
	const unit = await Unit.create(
		{ editionId, number, slug, title, summary, lesson, figures },
		{ transaction }
	);
	const rows = exercises.map((definition, index) => ({
		editionId,
		unitId: unit.id,
		number: index + 1,
		slug: definition.slug,
		title: definition.title,
		definition,
		situationHtml: renderMarkdownTemplate(definition.situation),
		tries: definition.tries
	}));
	await Exercise.bulkCreate(rows, { transaction });
}
