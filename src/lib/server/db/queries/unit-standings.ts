import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '../connection';

/** A unit with what it needs first, and how far a person has come in it. */
export interface UnitStandingRow {
	slug: string;
	number: number;
	title: string;
	needs: string[];
	doneWith: number;
	/** Exercises with an attempt passed in any edition, practice too. */
	right: number;
}

/** The units of an edition, in order, as they stand for one person. */
export async function unitStandings(
	userId: number,
	{ id: editionId, courseId }: { id: number; courseId: number },
	transaction?: Transaction
): Promise<UnitStandingRow[]> {
	const rows = await sequelize.query<Omit<UnitStandingRow, 'needs'> & { needs: string }>(
		`SELECT u.slug, u.number, u.title, u.needs,
			COALESCE(u.done_with, (SELECT COUNT(*) FROM exercises e WHERE e.unit_id = u.id)) AS doneWith,
			(SELECT COUNT(*) FROM exercises e WHERE e.unit_id = u.id AND e.slug IN (
				SELECT o.slug FROM attempts a JOIN exercises o ON o.id = a.exercise_id
				JOIN editions d ON d.id = o.edition_id JOIN findings f ON f.attempt_id = a.id
				WHERE a.user_id = :userId AND d.course_id = :courseId AND f.passed)) AS \`right\`
		FROM units u WHERE u.edition_id = :editionId ORDER BY u.number`,
		{ type: QueryTypes.SELECT, replacements: { userId, courseId, editionId }, transaction }
	);
	return rows.map(({ needs, doneWith, right, ...unit }) => ({
		...unit,
		needs: (typeof needs === 'string' ? JSON.parse(needs) : needs) as string[],
		doneWith: Number(doneWith),
		right: Number(right)
	}));
}
