import { Edition } from '$lib/server/db/models/edition';
import { EditionFile } from '$lib/server/db/models/edition-file';

/**
 * Hashes of the files of a course as it came with the product, in its newest edition from content/: what stands
 * as it was published there may be published again.
 */
export async function shippedHashes(courseId: number): Promise<Set<string>> {
	const edition = await Edition.findOne({
		where: { courseId, publishedBy: null },
		order: [['number', 'DESC']],
		attributes: ['id']
	});
	if (!edition) return new Set();
	const files = await EditionFile.findAll({ where: { editionId: edition.id }, attributes: ['hash'] });
	return new Set(files.map(({ hash }) => hash));
}
