import type { MigrationStep } from '../src/lib/server/db/migration';

/** Who has a draft's file open, told by their page every few seconds. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE open_files (
			file_id BIGINT UNSIGNED NOT NULL,
			user_id INT UNSIGNED NOT NULL,
			opened_at DATETIME(3) NOT NULL,
			seen_at DATETIME(3) NOT NULL,
			PRIMARY KEY (file_id, user_id),
			CONSTRAINT open_files_file FOREIGN KEY (file_id) REFERENCES draft_files (id) ON DELETE CASCADE,
			CONSTRAINT open_files_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE open_files');
