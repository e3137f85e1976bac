import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE editions (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			course_id BIGINT UNSIGNED NOT NULL,
			number INT UNSIGNED NOT NULL,
			title VARCHAR(300) NOT NULL,
			summary VARCHAR(300) NOT NULL,
			content_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			created_at DATETIME(3) NOT NULL,
			UNIQUE KEY editions_course_number (course_id, number),
			CONSTRAINT editions_course FOREIGN KEY (course_id) REFERENCES courses (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE editions');
