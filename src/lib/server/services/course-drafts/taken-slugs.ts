import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '$lib/server/db/connection';

/**
 * Slugs of units and exercises in the newest editions of other courses: those are found by their slugs alone,
 * so that no two may have one.
 */
export async function slugsElsewhere(
	courseId: number,
	transaction?: Transaction
): Promise<{ units: Set<string>; exercises: Set<string> }> {
	const newest = `JOIN editions d ON d.id = t.edition_id
		WHERE d.course_id <> :courseId
			AND d.number = (SELECT MAX(n.number) FROM editions n WHERE n.course_id = d.course_id)`;
	const slugsIn = async (table: 'units' | 'exercises') => {
		const rows = await sequelize.query<{ slug: string }>(`SELECT t.slug FROM ${table} t ${newest}`, {
			type: QueryTypes.SELECT,
			replacements: { courseId },
			transaction
		});
		return new Set(rows.map(({ slug }) => slug));
	};
	return { units: await slugsIn('units'), exercises: await slugsIn('exercises') };
}
