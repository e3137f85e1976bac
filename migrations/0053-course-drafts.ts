import type { MigrationStep } from '../src/lib/server/db/migration';

/** The one draft of a course, from which its next edition is published. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE course_drafts (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			course_id BIGINT UNSIGNED NOT NULL,
			edition_id BIGINT UNSIGNED NULL,
			created_by INT UNSIGNED NOT NULL,
			created_at DATETIME(3) NOT NULL,
			UNIQUE KEY course_drafts_course (course_id),
			CONSTRAINT course_drafts_course FOREIGN KEY (course_id) REFERENCES courses (id),
			CONSTRAINT course_drafts_edition FOREIGN KEY (edition_id) REFERENCES editions (id),
			CONSTRAINT course_drafts_user FOREIGN KEY (created_by) REFERENCES users (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE course_drafts');
