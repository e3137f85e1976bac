import type { Transaction } from 'sequelize';
import { treeOfFiles, type ContentTree } from '$lib/server/content/content-tree';
import { draftFileContents } from '$lib/server/db/queries/draft-files';
import { ARCHIVE } from './find-draft';

/** The files of a draft's course, without what was taken out of it. */
export async function draftFilesOf(
	draftId: number,
	transaction?: Transaction
): Promise<Map<string, Uint8Array>> {
	const files = await draftFileContents(draftId, transaction);
	return new Map(
		files.filter(({ path }) => !path.startsWith(ARCHIVE)).map(({ path, bytes }) => [path, bytes])
	);
}

export const draftTree = (slug: string, files: ReadonlyMap<string, Uint8Array>): ContentTree =>
	treeOfFiles(slug, files);
