/** What of content/ needs no checking again, because nothing in its files has changed. */
import { QueryTypes, type Transaction } from 'sequelize';
import type { CheckedExercises } from '$lib/server/content/read-exercise';
import { sequelize } from '$lib/server/db/connection';
import { CheckedContent } from '$lib/server/db/models/checked-content';
import type { ImportedCourse } from './import-content';

/** Each course's newest edition, when every one of these hashes is that of a course as it stands there; else null. */
export async function publishedAlready(hashes: string[]): Promise<ImportedCourse[] | null> {
	if (hashes.length === 0) return [];
	const rows = await sequelize.query<{
		hash: string;
		slug: string;
		edition: number;
		publishedBy: number | null;
	}>(
		`SELECT checked_content.hash, courses.slug, editions.number AS edition, editions.published_by AS publishedBy
		FROM checked_content
		JOIN editions ON editions.id = checked_content.edition_id
		JOIN courses ON courses.id = editions.course_id
		WHERE checked_content.hash IN (:hashes)
			AND EXISTS (SELECT 1 FROM edition_files WHERE edition_files.edition_id = editions.id)
			AND editions.number = (SELECT MAX(number) FROM editions AS others WHERE others.course_id = courses.id)`,
		{ replacements: { hashes }, type: QueryTypes.SELECT }
	);
	const found = hashes.map((hash) => rows.find((row) => row.hash === hash));
	if (found.includes(undefined)) return null;
	return found.map((row) => ({
		slug: row!.slug,
		edition: row!.edition,
		created: false,
		writtenAtDesk: row!.publishedBy !== null
	}));
}

/** Every exercise checked before, by the hash of its file. */
export async function checkedExercises(): Promise<CheckedExercises> {
	const rows = await CheckedContent.findAll({ where: { editionId: null } });
	return new Map(rows.flatMap(({ hash, definition }) => (definition ? [[hash, definition]] : [])));
}

export const noteCourse = (
	hash: string,
	editionId: number,
	checkedAt: Date,
	transaction: Transaction
): Promise<unknown> =>
	CheckedContent.bulkCreate([{ hash, editionId, definition: null, checkedAt }], {
		updateOnDuplicate: ['editionId', 'checkedAt'],
		transaction
	});

/** Adds those that are new; what is known stays. */
export async function noteExercises(
	checked: CheckedExercises,
	checkedAt: Date,
	transaction: Transaction
): Promise<void> {
	const rows = [...checked].map(([hash, definition]) => ({ hash, editionId: null, definition, checkedAt }));
	if (rows.length > 0)
		await CheckedContent.bulkCreate(rows, { updateOnDuplicate: ['checkedAt'], transaction });
}
