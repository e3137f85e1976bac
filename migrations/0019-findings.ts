import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE findings (
			attempt_id BIGINT UNSIGNED NOT NULL PRIMARY KEY,
			passed BOOLEAN NOT NULL,
			finding JSON NOT NULL,
			engine_version INT UNSIGNED NOT NULL,
			graded_at DATETIME(3) NOT NULL,
			CONSTRAINT findings_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE findings');
