import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE attempts (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			user_id INT UNSIGNED NOT NULL,
			edition_id BIGINT UNSIGNED NOT NULL,
			exercise_id BIGINT UNSIGNED NOT NULL,
			number INT UNSIGNED NOT NULL,
			seed CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			engine_version INT UNSIGNED NOT NULL,
			next_row INT UNSIGNED NOT NULL DEFAULT 0,
			clock_s DOUBLE NOT NULL DEFAULT 0,
			row_end_s DOUBLE NOT NULL DEFAULT 0,
			stream_token CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL,
			hints_revealed INT UNSIGNED NOT NULL DEFAULT 0,
			protection_tripped BOOLEAN NOT NULL DEFAULT FALSE,
			protection_trips INT UNSIGNED NOT NULL DEFAULT 0,
			started_at DATETIME(3) NOT NULL,
			closed_at DATETIME(3) NULL,
			open_marker TINYINT AS (IF(closed_at IS NULL, 1, NULL)) PERSISTENT,
			UNIQUE KEY attempts_number (user_id, exercise_id, number),
			UNIQUE KEY attempts_one_open (user_id, exercise_id, open_marker),
			CONSTRAINT attempts_user FOREIGN KEY (user_id) REFERENCES users (id),
			CONSTRAINT attempts_edition FOREIGN KEY (edition_id) REFERENCES editions (id),
			CONSTRAINT attempts_exercise FOREIGN KEY (exercise_id) REFERENCES exercises (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE attempts');
