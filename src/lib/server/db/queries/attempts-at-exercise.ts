import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '../connection';
import type { PlacedExercise } from './find-exercise';

/** One person's attempt as a list shows it. */
export interface AttemptLine {
	id: number;
	exerciseSlug: string;
	number: number;
	startedAt: Date;
	closedAt: Date | null;
	/** Null while it is open. */
	passed: 0 | 1 | null;
	/** Questions it asked, answers handed in, and those of them that were right. */
	questions: number;
	answered: number;
	rightAnswers: number;
	/** Of those, the ones whose method was right too. */
	cleanAnswers: number;
	practice: 0 | 1;
}

/** A person's attempts in a course, whatever its edition, oldest first; of one exercise if `slug` is given. */
export function listAttempts(
	userId: number,
	courseId: number,
	slug: string | null,
	transaction?: Transaction
): Promise<AttemptLine[]> {
	return sequelize.query<AttemptLine>(
		`SELECT a.id, e.slug AS exerciseSlug, a.number, a.started_at AS startedAt, a.closed_at AS closedAt, f.passed,
			CAST(JSON_LENGTH(e.definition, '$.questions') AS INT) AS questions,
			CAST((SELECT COUNT(*) FROM answers x WHERE x.attempt_id = a.id) AS INT) AS answered,
			CAST((SELECT COUNT(*) FROM answers x WHERE x.attempt_id = a.id AND x.verdict LIKE 'right%') AS INT) AS rightAnswers,
			CAST((SELECT COUNT(*) FROM answers x WHERE x.attempt_id = a.id AND x.verdict = 'right') AS INT) AS cleanAnswers,
			a.practice
		FROM attempts a
		JOIN exercises e ON e.id = a.exercise_id
		JOIN editions d ON d.id = e.edition_id
		LEFT JOIN findings f ON f.attempt_id = a.id
		WHERE a.user_id = :userId AND d.course_id = :courseId AND (:slug IS NULL OR e.slug = :slug)
		ORDER BY a.id`,
		{ type: QueryTypes.SELECT, replacements: { userId, courseId, slug }, transaction }
	);
}

/** A person's attempts at an exercise, whatever the edition, oldest first. */
export const attemptsAtExercise = (
	userId: number,
	exercise: PlacedExercise,
	transaction?: Transaction
): Promise<AttemptLine[]> => listAttempts(userId, exercise.edition.courseId, exercise.slug, transaction);
