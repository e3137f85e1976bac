import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE drafts (
			attempt_id BIGINT UNSIGNED NOT NULL PRIMARY KEY,
			answers JSON NOT NULL,
			saved_at DATETIME(3) NOT NULL,
			CONSTRAINT drafts_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE drafts');
