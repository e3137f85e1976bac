import { QueryTypes } from 'sequelize';
import { sequelize } from '../connection';

/** How an exercise of a course goes, over everybody and every edition, practice apart. */
export interface ExerciseFigures {
	courseId: number;
	slug: string;
	people: number;
	closed: number;
	passed: number;
	open: number;
}

export const exerciseFigures = (): Promise<ExerciseFigures[]> =>
	sequelize.query<ExerciseFigures>(
		`SELECT d.course_id AS courseId, e.slug, COUNT(DISTINCT a.user_id) AS people,
			COUNT(f.attempt_id) AS closed, CAST(COALESCE(SUM(f.passed), 0) AS INT) AS passed,
			CAST(SUM(a.closed_at IS NULL) AS INT) AS open
		FROM attempts a
		JOIN exercises e ON e.id = a.exercise_id
		JOIN editions d ON d.id = e.edition_id
		LEFT JOIN findings f ON f.attempt_id = a.id
		WHERE NOT a.practice
		GROUP BY d.course_id, e.slug`,
		{ type: QueryTypes.SELECT }
	);

/** An attempt as those who teach see it. */
export interface BenchLine {
	id: number;
	userId: number;
	displayName: string;
	exerciseTitle: string;
	number: number;
	/** Of an open one, when something was last set, read or typed at it; of a closed one, when it closed. */
	at: Date;
	/** Null while it is open. */
	passed: 0 | 1 | null;
}

const columns = `a.id, a.user_id AS userId, u.display_name AS displayName, e.title AS exerciseTitle, a.number`;
const tables = `attempts a JOIN users u ON u.id = a.user_id JOIN exercises e ON e.id = a.exercise_id`;

/** Open attempts at which something was done since then, the latest first. */
export const openSince = (since: Date, most: number): Promise<BenchLine[]> =>
	sequelize.query<BenchLine>(
		`SELECT * FROM (
			SELECT ${columns}, NULL AS passed, GREATEST(a.started_at,
				COALESCE((SELECT MAX(s.logged_at) FROM set_ups s WHERE s.attempt_id = a.id), a.started_at),
				COALESCE((SELECT MAX(r.taken_at) FROM readings r WHERE r.attempt_id = a.id), a.started_at),
				COALESCE((SELECT t.saved_at FROM drafts t WHERE t.attempt_id = a.id), a.started_at)) AS at
			FROM ${tables} WHERE a.closed_at IS NULL
		) open WHERE open.at >= :since ORDER BY open.at DESC LIMIT :most`,
		{ type: QueryTypes.SELECT, replacements: { since, most } }
	);

/** The attempts that closed last, with a finding. */
export const latestClosed = (most: number): Promise<BenchLine[]> =>
	sequelize.query<BenchLine>(
		`SELECT ${columns}, f.passed, a.closed_at AS at
		FROM ${tables} JOIN findings f ON f.attempt_id = a.id
		WHERE a.closed_at IS NOT NULL ORDER BY a.closed_at DESC, a.id DESC LIMIT :most`,
		{ type: QueryTypes.SELECT, replacements: { most } }
	);
