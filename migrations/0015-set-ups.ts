import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE set_ups (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			attempt_id BIGINT UNSIGNED NOT NULL,
			number INT UNSIGNED NOT NULL,
			settings JSON NOT NULL,
			first_row INT UNSIGNED NOT NULL,
			clock_s DOUBLE NOT NULL,
			restart_row INT UNSIGNED NOT NULL,
			end_row INT UNSIGNED NULL,
			drawn_to INT UNSIGNED NULL,
			tripped BOOLEAN NOT NULL DEFAULT FALSE,
			logged_at DATETIME(3) NOT NULL,
			UNIQUE KEY set_ups_number (attempt_id, number),
			CONSTRAINT set_ups_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id),
			CONSTRAINT set_ups_drawn CHECK (drawn_to IS NULL OR drawn_to >= first_row)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE set_ups');
