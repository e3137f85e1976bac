import type { Transaction } from 'sequelize';
import type { RestoreRequest, SavedFile, SaveFileRequest } from '$lib/schemas/desk';
import type { DraftFile } from '$lib/server/db/models/draft-file';
import { DraftFileVersion } from '$lib/server/db/models/draft-file-version';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getDraft, getDraftFileRow, refuseReaders } from './find-draft';
import { nameOf, textOf, viewOfFile } from './get-draft-file';
import { changeDraftFile } from './write-draft-file';

/**
 * Keeps what was typed.
 * @throws DomainError `not_found`; `conflict` with their text under `theirs` when somebody else has saved in between
 */
export function saveDraftFile(
	actor: Actor,
	slug: string,
	{ path, text, revision }: SaveFileRequest,
	now: Date
): Promise<SavedFile> {
	refuseReaders(actor);
	return inTransaction(async (transaction) => {
		const bytes = Buffer.from(text, 'utf8');
		const draft = await getDraft(slug, transaction);
		const file = await getDraftFileRow(draft.id, path, transaction, true);
		await refuseOverwriting(file, revision, bytes, transaction);
		await changeDraftFile(file, { bytes, origin: 'typed', by: actor.id, now }, transaction);
		return savedFile(file, transaction);
	});
}

/**
 * Brings an earlier version of a file back. What it held until now stays in its history.
 * @throws DomainError `not_found`; `conflict` as for a save
 */
export function restoreDraftFile(
	actor: Actor,
	slug: string,
	{ path, versionId, revision }: RestoreRequest,
	now: Date
): Promise<SavedFile> {
	refuseReaders(actor);
	return inTransaction(async (transaction) => {
		const draft = await getDraft(slug, transaction);
		const file = await getDraftFileRow(draft.id, path, transaction, true);
		const version = await DraftFileVersion.findOne({
			where: { id: versionId, fileId: file.id },
			transaction
		});
		if (!version) throw new DomainError('not_found', 'The file has no such version.');
		const bytes = Buffer.from(await textOf(version.hash, transaction), 'utf8');
		await refuseOverwriting(file, revision, bytes, transaction);
		const note = `the version of ${version.changedAt.toISOString().slice(0, 16).replace('T', ', ')} UTC`;
		await changeDraftFile(file, { bytes, origin: 'restored', note, by: actor.id, now }, transaction);
		return savedFile(file, transaction);
	});
}

/** Two who have come to the same text have no quarrel. */
async function refuseOverwriting(
	file: DraftFile,
	revision: number,
	bytes: Buffer,
	transaction: Transaction
): Promise<void> {
	if (file.revision === revision) return;
	const theirs = await viewOfFile(file, transaction);
	if (theirs.text === bytes.toString('utf8')) return;
	const message = `${theirs.changedBy} has saved this file since you opened it.`;
	throw new DomainError('conflict', message, { details: { theirs } });
}

const savedFile = async (file: DraftFile, transaction: Transaction): Promise<SavedFile> => ({
	revision: file.revision,
	changedBy: await nameOf(file.changedBy, transaction),
	changedAt: file.changedAt.toISOString()
});
