import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '../connection';

/** A course as published now. */
export interface PublishedCourse {
	courseId: number;
	slug: string;
	editionId: number;
	edition: number;
	title: string;
	summary: string;
}

/** Every course in its newest edition, by title. */
export const newestEditions = (transaction?: Transaction): Promise<PublishedCourse[]> =>
	sequelize.query<PublishedCourse>(
		`SELECT c.id AS courseId, c.slug, d.id AS editionId, d.number AS edition, d.title, d.summary
		FROM courses c
		JOIN editions d ON d.course_id = c.id
		WHERE d.number = (SELECT MAX(n.number) FROM editions n WHERE n.course_id = c.id)
		ORDER BY d.title`,
		{ type: QueryTypes.SELECT, transaction }
	);
