import type { Transaction } from 'sequelize';
import type { ContentTree } from '$lib/server/content/content-tree';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { keepContents } from './keep-contents';

/** Notes what files an edition was made of, where that hasn't been noted. */
export async function noteEditionFiles(
	editionId: number,
	tree: ContentTree,
	transaction: Transaction
): Promise<void> {
	if ((await EditionFile.count({ where: { editionId }, transaction })) > 0) return;
	const hashes = await keepContents(
		tree.paths.map((path) => tree.read(path) as Uint8Array),
		transaction
	);
	await EditionFile.bulkCreate(
		tree.paths.map((path, i) => ({ editionId, path, hash: hashes[i] })),
		{ transaction }
	);
}
