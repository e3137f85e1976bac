import type { Transaction } from 'sequelize';
import type { DraftFileView } from '$lib/schemas/desk';
import type { DraftFile } from '$lib/server/db/models/draft-file';
import { FileContent } from '$lib/server/db/models/file-content';
import { User } from '$lib/server/db/models/user';
import type { Actor } from '$lib/server/domain/role';
import { getDraft, getDraftFileRow, refuseReaders } from './find-draft';

/** A file of a draft to be edited. @throws DomainError `not_found` */
export async function getDraftFile(actor: Actor, slug: string, path: string): Promise<DraftFileView> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	return viewOfFile(await getDraftFileRow(draft.id, path));
}

/** What a file holds, as text. */
export async function textOf(hash: string, transaction?: Transaction): Promise<string> {
	const content = await FileContent.findByPk(hash, { transaction });
	if (!content) throw new Error(`The content ${hash} is not kept`);
	return content.bytes.toString('utf8');
}

export async function viewOfFile(file: DraftFile, transaction?: Transaction): Promise<DraftFileView> {
	const { path, revision, changedAt } = file;
	return {
		...{ path, revision, changedAt: changedAt.toISOString() },
		changedBy: await nameOf(file.changedBy, transaction),
		text: await textOf(file.hash, transaction)
	};
}

export async function nameOf(userId: number, transaction?: Transaction): Promise<string> {
	const user = await User.findByPk(userId, { attributes: ['displayName'], transaction });
	return user?.displayName ?? 'somebody';
}
