import { QueryTypes } from 'sequelize';
import { sequelize } from '../connection';

// Texts out of JSON have the collation of the connection; columns have the table's.
const QUESTIONS = `JSON_TABLE(e.definition, '$.questions[*]' COLUMNS (
	id VARCHAR(60) COLLATE utf8mb4_unicode_ci PATH '$.id',
	skill VARCHAR(80) COLLATE utf8mb4_unicode_ci PATH '$.skill')) q`;

/** A question of a closed attempt, with the verdict on its answer; null for one left out. */
export interface SkillAnswer {
	/** Slug of the unit that teaches the skill. */
	skill: string;
	verdict: string | null;
}

/** What a person has answered in a course, whatever its edition, practice too, in the order the attempts closed. */
export const skillAnswers = (userId: number, courseId: number): Promise<SkillAnswer[]> =>
	sequelize.query<SkillAnswer>(
		`SELECT COALESCE(q.skill, u.slug) AS skill, x.verdict
		FROM attempts a JOIN exercises e ON e.id = a.exercise_id JOIN units u ON u.id = e.unit_id
		JOIN editions d ON d.id = e.edition_id JOIN findings f ON f.attempt_id = a.id
		JOIN ${QUESTIONS}
		LEFT JOIN answers x ON x.attempt_id = a.id AND x.question = q.id
		WHERE a.user_id = :userId AND d.course_id = :courseId AND a.closed_at IS NOT NULL
		ORDER BY a.closed_at, a.id`,
		{ type: QueryTypes.SELECT, replacements: { userId, courseId } }
	);

/** Which exercises of an edition ask for which skill. */
export const skillExercises = (editionId: number): Promise<{ skill: string; exercise: string }[]> =>
	sequelize.query(
		`SELECT DISTINCT COALESCE(q.skill, u.slug) AS skill, e.slug AS exercise
		FROM exercises e JOIN units u ON u.id = e.unit_id JOIN ${QUESTIONS}
		WHERE e.edition_id = :editionId`,
		{ type: QueryTypes.SELECT, replacements: { editionId } }
	);
