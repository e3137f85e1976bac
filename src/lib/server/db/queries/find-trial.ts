import { QueryTypes } from 'sequelize';
import { sequelize } from '../connection';

/** The id of the first published exercise that anyone may try; undefined when there is none. */
export async function findTrialId(): Promise<number | undefined> {
	const rows = await sequelize.query<{ id: number }>(
		`SELECT e.id FROM exercises e JOIN editions d ON d.id = e.edition_id
		WHERE d.number = (SELECT MAX(n.number) FROM editions n WHERE n.course_id = d.course_id)
			AND JSON_EXISTS(e.definition, '$.trial')
		ORDER BY e.id LIMIT 1`,
		{ type: QueryTypes.SELECT }
	);
	return rows.at(0)?.id;
}
