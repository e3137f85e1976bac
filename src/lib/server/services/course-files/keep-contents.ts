import type { Transaction } from 'sequelize';
import { hashOfBytes } from '$lib/server/content/content-hash';
import { FileContent } from '$lib/server/db/models/file-content';

/** Keeps what files hold, each once. @returns the hash of each, in order */
export async function keepContents(
	contents: readonly Uint8Array[],
	transaction: Transaction
): Promise<string[]> {
	const rows = contents.map((bytes) => ({ hash: hashOfBytes(bytes), bytes: Buffer.from(bytes) }));
	const unique = [...new Map(rows.map((row) => [row.hash, row])).values()];
	const known = new Set(
		(
			await FileContent.findAll({
				where: { hash: unique.map(({ hash }) => hash) },
				attributes: ['hash'],
				transaction
			})
		).map(({ hash }) => hash)
	);
	// In the order of their hashes, so that two who keep the same files never wait for each other in a circle.
	const added = unique.filter(({ hash }) => !known.has(hash)).sort((a, b) => (a.hash < b.hash ? -1 : 1));
	if (added.length > 0) await FileContent.bulkCreate(added, { updateOnDuplicate: ['hash'], transaction });
	return rows.map(({ hash }) => hash);
}
