import type { Transaction } from 'sequelize';
import { hashOfCourse } from '$lib/server/content/content-hash';
import type { CourseContent } from '$lib/server/content/course-content';
import { coursesIn, treeOfFolder } from '$lib/server/content/folder-tree';
import { readContent } from '$lib/server/content/read-content';
import { inTransaction } from '$lib/server/db/transaction';
import { noteEditionFiles } from '../course-files/edition-files';
import { checkedExercises, noteCourse, noteExercises, publishedAlready } from './checked-content';
import { createEdition, hashOfContent } from './create-edition';
import { lockedCourse, newestEdition } from './lock-course';

export interface ImportedCourse {
	slug: string;
	/** The newest edition's number. */
	edition: number;
	/** False when the content is what that edition was made of already. */
	created: boolean;
	/** True when somebody has published this course at the desk: then content/ has no more say in it. */
	writtenAtDesk: boolean;
}

/**
 * Publishes what stands under `root`: a new edition of every course whose content has changed since its newest one,
 * but for courses whose newest edition was published at the desk. Editions that exist are never touched.
 * Any number of processes may run it at once.
 * @throws ContentError with file, line and field at the first fault; nothing is published then
 */
export async function importContent({ root, now }: { root: string; now: Date }): Promise<ImportedCourse[]> {
	const hashes = new Map(coursesIn(root).map((folder) => [folder, hashOfCourse(treeOfFolder(root, folder))]));
	const unchanged = await publishedAlready([...hashes.values()]);
	if (unchanged) return unchanged;
	const checked = await checkedExercises();
	const courses = readContent(root, checked);
	return inTransaction(async (transaction) => {
		const imported: ImportedCourse[] = [];
		for (const course of courses) {
			const published = await importCourse(root, course, now, transaction);
			imported.push(published.course);
			const hash = hashes.get(course.slug) as string;
			await noteCourse(hash, published.editionId, now, transaction);
		}
		await noteExercises(checked, now, transaction);
		return imported;
	});
}

async function importCourse(
	root: string,
	content: CourseContent,
	now: Date,
	transaction: Transaction
): Promise<{ course: ImportedCourse; editionId: number }> {
	const { slug } = content;
	const course = await lockedCourse(slug, now, transaction);
	const newest = await newestEdition(course.id, transaction);
	const tree = treeOfFolder(root, slug);
	const writtenAtDesk = newest !== null && newest.publishedBy !== null;
	if (newest && (writtenAtDesk || newest.contentHash === hashOfContent(content))) {
		// Editions made before files were kept get theirs now.
		if (!writtenAtDesk) await noteEditionFiles(newest.id, tree, transaction);
		return {
			course: { slug, edition: newest.number, created: false, writtenAtDesk },
			editionId: newest.id
		};
	}
	const number = (newest?.number ?? 0) + 1;
	const edition = await createEdition(
		{ courseId: course.id, number, content, tree, publishedBy: null, now },
		transaction
	);
	return { course: { slug, edition: number, created: true, writtenAtDesk }, editionId: edition.id };
}
