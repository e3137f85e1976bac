import { QueryTypes } from 'sequelize';
import { sequelize } from '../connection';

/** An exercise where it stands in the newest edition of its course. */
export interface OutlineLine {
	courseId: number;
	slug: string;
	title: string;
	unit: number;
	number: number;
}

/** The newest edition of each course, with how much there is of it. */
export interface EditionLine {
	title: string;
	edition: number;
	publishedAt: Date;
	units: number;
	exercises: number;
}

const NEWEST = 'd.number = (SELECT MAX(n.number) FROM editions n WHERE n.course_id = d.course_id)';

/** Every exercise as published now, in order. */
export const publishedOutline = (): Promise<OutlineLine[]> =>
	sequelize.query<OutlineLine>(
		`SELECT d.course_id AS courseId, e.slug, e.title, u.number AS unit, e.number
		FROM editions d JOIN units u ON u.edition_id = d.id JOIN exercises e ON e.unit_id = u.id
		WHERE ${NEWEST} ORDER BY d.title, u.number, e.number`,
		{ type: QueryTypes.SELECT }
	);

export const publishedEditions = (): Promise<EditionLine[]> =>
	sequelize.query<EditionLine>(
		`SELECT d.title, d.number AS edition, d.created_at AS publishedAt,
			(SELECT COUNT(*) FROM units u WHERE u.edition_id = d.id) AS units,
			(SELECT COUNT(*) FROM exercises e WHERE e.edition_id = d.id) AS exercises
		FROM editions d WHERE ${NEWEST} ORDER BY d.title`,
		{ type: QueryTypes.SELECT }
	);
