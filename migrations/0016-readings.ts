import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE readings (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			attempt_id BIGINT UNSIGNED NOT NULL,
			set_up_id BIGINT UNSIGNED NOT NULL,
			from_row INT UNSIGNED NOT NULL,
			to_row INT UNSIGNED NOT NULL,
			trace INT UNSIGNED NOT NULL,
			mode VARCHAR(16) NOT NULL,
			row_count INT UNSIGNED NOT NULL,
			request JSON NOT NULL,
			kind VARCHAR(40) NOT NULL,
			value DOUBLE NOT NULL,
			unit VARCHAR(16) NOT NULL,
			spread DOUBLE NOT NULL,
			remarks JSON NOT NULL,
			parts JSON NULL,
			trace_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			engine_version INT UNSIGNED NOT NULL,
			taken_at DATETIME(3) NOT NULL,
			KEY readings_attempt (attempt_id, id),
			CONSTRAINT readings_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id),
			CONSTRAINT readings_set_up FOREIGN KEY (set_up_id) REFERENCES set_ups (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE readings');
