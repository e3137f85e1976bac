import type { Transaction } from 'sequelize';
import { Course } from '$lib/server/db/models/course';
import { CourseDraft } from '$lib/server/db/models/course-draft';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { DraftFileVersion } from '$lib/server/db/models/draft-file-version';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { newestEdition } from '../courses/lock-course';
import { refuseReaders } from './find-draft';

/**
 * Begins the draft of a course from its newest edition; leaves one alone that is there.
 * @throws DomainError `not_found`; `conflict` for an edition of which no files were kept
 */
export function startDraft(actor: Actor, slug: string, now: Date): Promise<void> {
	refuseReaders(actor);
	return inTransaction(async (transaction) => {
		const course = await Course.findOne({ where: { slug }, lock: transaction.LOCK.UPDATE, transaction });
		const edition = course && (await newestEdition(course.id, transaction));
		if (!course || !edition) throw new DomainError('not_found', 'There is no such course.');
		if (await CourseDraft.findOne({ where: { courseId: course.id }, transaction })) return;
		const files = await EditionFile.findAll({ where: { editionId: edition.id }, transaction });
		if (files.length === 0) {
			const message = `Edition ${edition.number} was made before files were kept. Import the course once more.`;
			throw new DomainError('conflict', message);
		}
		const draft = await CourseDraft.create(
			{ courseId: course.id, editionId: edition.id, createdBy: actor.id, createdAt: now },
			{ transaction }
		);
		await copyFiles(draft, files, actor.id, now, transaction);
	});
}

async function copyFiles(
	draft: CourseDraft,
	files: EditionFile[],
	changedBy: number,
	now: Date,
	transaction: Transaction
): Promise<void> {
	await DraftFile.bulkCreate(
		files.map(({ path, hash }) => ({
			...{ draftId: draft.id, path, hash },
			...{ revision: 1, changedBy, changedAt: now }
		})),
		{ transaction }
	);
	const made = await DraftFile.findAll({ where: { draftId: draft.id }, transaction });
	await DraftFileVersion.bulkCreate(
		made.map(({ id: fileId, hash }) => ({
			...{ fileId, hash, revision: 1, origin: 'begun' as const },
			...{ changedBy, begunAt: now, changedAt: now }
		})),
		{ transaction }
	);
}
