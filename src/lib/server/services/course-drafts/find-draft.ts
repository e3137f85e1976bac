import type { Transaction } from 'sequelize';
import { Course } from '$lib/server/db/models/course';
import { CourseDraft } from '$lib/server/db/models/course-draft';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';

/** Under this folder lies what was taken out of a course, to be brought back. */
export const ARCHIVE = 'archive/';

/** @throws DomainError `forbidden` for whoever may not write courses */
export const refuseReaders = (actor: Actor): void =>
	refuseUnless(actor, 'course.author', { message: 'Courses are written by instructors.' });

/**
 * The draft of the course `slug`.
 * @param lock when the course's outline is to be changed: whoever else changes it waits
 * @throws DomainError `not_found`
 */
export async function getDraft(
	slug: string,
	transaction?: Transaction,
	lock = false
): Promise<CourseDraft & { course: Course }> {
	const course = await Course.findOne({ where: { slug }, transaction });
	const draft = course
		? await CourseDraft.findOne({
				where: { courseId: course.id },
				transaction,
				lock: lock && transaction ? transaction.LOCK.UPDATE : undefined
			})
		: null;
	if (!course || !draft) throw new DomainError('not_found', 'There is no draft of such a course.');
	return Object.assign(draft, { course });
}

/** A file of a draft. @throws DomainError `not_found` */
export async function getDraftFileRow(
	draftId: number,
	path: string,
	transaction?: Transaction,
	lock = false
): Promise<DraftFile> {
	const file = await DraftFile.findOne({
		where: { draftId, path },
		transaction,
		lock: lock && transaction ? transaction.LOCK.UPDATE : undefined
	});
	if (!file) throw new DomainError('not_found', 'The draft has no such file.');
	return file;
}

/** For what reads its input before it looks for the draft: refuses first. @throws DomainError `forbidden`; `not_found` */
export async function requireDraft(actor: Actor, slug: string): Promise<void> {
	refuseReaders(actor);
	await getDraft(slug);
}
