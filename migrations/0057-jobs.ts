import type { MigrationStep } from '../src/lib/server/db/migration';

/** Work that outlasts a request. Any number of processes claim it, one at a time for each. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE jobs (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			subject VARCHAR(100) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			payload JSON NOT NULL,
			state ENUM('waiting', 'running', 'done', 'failed', 'cancelled') NOT NULL DEFAULT 'waiting',
			tries INT UNSIGNED NOT NULL DEFAULT 0,
			run_after DATETIME(3) NOT NULL,
			lease_token CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL,
			lease_until DATETIME(3) NULL,
			done INT UNSIGNED NOT NULL DEFAULT 0,
			total INT UNSIGNED NOT NULL DEFAULT 0,
			problem VARCHAR(2000) NULL,
			created_by INT UNSIGNED NULL,
			created_at DATETIME(3) NOT NULL,
			ended_at DATETIME(3) NULL,
			KEY jobs_state (state, run_after),
			KEY jobs_subject (kind, subject, id),
			CONSTRAINT jobs_user FOREIGN KEY (created_by) REFERENCES users (id) ON DELETE SET NULL
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE jobs');
