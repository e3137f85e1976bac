import { QueryTypes } from 'sequelize';
import { sequelize } from '../connection';

/** A person with an account, and what they have done at exercises. */
export interface PersonLine {
	id: number;
	displayName: string;
	email: string;
	/** Roles with commas between. */
	roles: string | null;
	disabledAt: Date | null;
	lastSignInAt: Date | null;
	attempts: number;
	/** Different exercises with at least one attempt passed that counts. */
	passed: number;
}

const MOST = 500;

/** Everybody, by name; at most 500. */
export const listPeople = (): Promise<PersonLine[]> =>
	sequelize.query<PersonLine>(
		`SELECT u.id, u.display_name AS displayName, u.email, u.disabled_at AS disabledAt,
			u.last_sign_in_at AS lastSignInAt,
			(SELECT GROUP_CONCAT(r.role ORDER BY r.role) FROM user_roles r WHERE r.user_id = u.id) AS roles,
			(SELECT COUNT(*) FROM attempts a WHERE a.user_id = u.id) AS attempts,
			(SELECT COUNT(DISTINCT e.slug) FROM attempts a JOIN exercises e ON e.id = a.exercise_id
				JOIN findings f ON f.attempt_id = a.id AND f.passed WHERE a.user_id = u.id AND NOT a.practice) AS passed
		FROM users u
		ORDER BY u.display_name, u.id
		LIMIT ${MOST}`,
		{ type: QueryTypes.SELECT }
	);
