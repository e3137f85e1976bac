import type { MigrationStep } from '../src/lib/server/db/migration';

/** What a person sees of their own sessions, and a number to end one by: the id is never shown. */
export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		ALTER TABLE sessions
			ADD COLUMN number BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
			ADD UNIQUE KEY sessions_number (number),
			ADD COLUMN device VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'unknown',
			ADD COLUMN last_used_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3)
	`);

export const down: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		ALTER TABLE sessions DROP COLUMN last_used_at, DROP COLUMN device, DROP KEY sessions_number, DROP COLUMN number
	`);
