import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE answers (
			attempt_id BIGINT UNSIGNED NOT NULL,
			question VARCHAR(60) NOT NULL,
			text VARCHAR(60) NOT NULL,
			unit VARCHAR(16) NOT NULL,
			value DOUBLE NOT NULL,
			reading_id BIGINT UNSIGNED NULL,
			verdict VARCHAR(20) NOT NULL,
			mistakes JSON NOT NULL,
			PRIMARY KEY (attempt_id, question),
			CONSTRAINT answers_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id),
			CONSTRAINT answers_reading FOREIGN KEY (reading_id) REFERENCES readings (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE answers');
