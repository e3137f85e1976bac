import type { Transaction } from 'sequelize';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { DraftFileVersion, type VersionOrigin } from '$lib/server/db/models/draft-file-version';
import { keepContents } from '../course-files/keep-contents';

/** What one person types within so long is one version. */
export const FOLD_MS = 5 * 60_000;

export interface Change {
	bytes: Uint8Array;
	origin: VersionOrigin;
	note?: string | null;
	by: number;
	now: Date;
}

/** A file that the draft didn't have. */
export async function createDraftFile(
	draftId: number,
	path: string,
	change: Change,
	transaction: Transaction
): Promise<DraftFile> {
	const [hash] = await keepContents([change.bytes], transaction);
	const { by, now, origin, note = null } = change;
	const file = await DraftFile.create(
		{ draftId, path, hash, revision: 1, changedBy: by, changedAt: now },
		{ transaction }
	);
	await DraftFileVersion.create(
		{ fileId: file.id, hash, revision: 1, origin, note, changedBy: by, begunAt: now, changedAt: now },
		{ transaction }
	);
	return file;
}

/** What a file, whose row is locked, holds from now on. Nothing happens when it held that already. */
export async function changeDraftFile(
	file: DraftFile,
	change: Change,
	transaction: Transaction
): Promise<void> {
	const [hash] = await keepContents([change.bytes], transaction);
	if (hash === file.hash) return;
	const { by, now } = change;
	await file.update({ hash, revision: file.revision + 1, changedBy: by, changedAt: now }, { transaction });
	await noteVersion(file, change, transaction);
}

async function noteVersion(
	{ id: fileId, hash, revision }: DraftFile,
	{ origin, note = null, by, now }: Change,
	transaction: Transaction
): Promise<void> {
	const last = await DraftFileVersion.findOne({ where: { fileId }, order: [['id', 'DESC']], transaction });
	const folds =
		origin === 'typed' &&
		last?.origin === 'typed' &&
		last.changedBy === by &&
		now.getTime() - last.begunAt.getTime() < FOLD_MS;
	if (folds) {
		await last.update({ hash, revision, changedAt: now }, { transaction });
		return;
	}
	await DraftFileVersion.create(
		{ fileId, hash, revision, origin, note, changedBy: by, begunAt: now, changedAt: now },
		{ transaction }
	);
}
