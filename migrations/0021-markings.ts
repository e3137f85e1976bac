import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE markings (
			attempt_id BIGINT UNSIGNED NOT NULL PRIMARY KEY,
			markings JSON NOT NULL,
			saved_at DATETIME(3) NOT NULL,
			CONSTRAINT markings_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE markings');
