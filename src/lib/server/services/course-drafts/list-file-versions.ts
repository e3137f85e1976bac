import type { FileVersionText, FileVersionView } from '$lib/schemas/desk';
import { DraftFileVersion } from '$lib/server/db/models/draft-file-version';
import { fileVersionLines, type VersionLine } from '$lib/server/db/queries/draft-files';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getDraft, getDraftFileRow, refuseReaders } from './find-draft';
import { nameOf, textOf } from './get-draft-file';

const MOST_SHOWN = 200;

/** What a file held before, the newest first; the first is what it holds now. @throws DomainError `not_found` */
export async function listFileVersions(
	actor: Actor,
	slug: string,
	path: string
): Promise<{ versions: FileVersionView[] }> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const file = await getDraftFileRow(draft.id, path);
	return { versions: (await fileVersionLines(file.id, MOST_SHOWN)).map(presentVersion) };
}

/** One version with its text. @throws DomainError `not_found`, also for one of another draft */
export async function getFileVersion(
	actor: Actor,
	slug: string,
	path: string,
	versionId: number
): Promise<FileVersionText> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const file = await getDraftFileRow(draft.id, path);
	const version = await DraftFileVersion.findOne({ where: { id: versionId, fileId: file.id } });
	if (!version) throw new DomainError('not_found', 'The file has no such version.');
	const { id, revision, origin, note, begunAt, changedAt } = version;
	const changedBy = await nameOf(version.changedBy);
	const view = presentVersion({ id, revision, origin, note, changedBy, begunAt, changedAt });
	return { ...view, text: await textOf(version.hash) };
}

const presentVersion = (line: VersionLine): FileVersionView => ({
	id: line.id,
	origin: line.origin as FileVersionView['origin'],
	note: line.note,
	changedBy: line.changedBy,
	begunAt: line.begunAt.toISOString(),
	changedAt: line.changedAt.toISOString()
});
