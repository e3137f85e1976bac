import type { MigrationStep } from '../src/lib/server/db/migration';

/** The files of a draft as they stand. What was taken out of the course lies under archive/. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE draft_files (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			draft_id BIGINT UNSIGNED NOT NULL,
			path VARCHAR(200) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			revision INT UNSIGNED NOT NULL,
			changed_by INT UNSIGNED NOT NULL,
			changed_at DATETIME(3) NOT NULL,
			UNIQUE KEY draft_files_path (draft_id, path),
			CONSTRAINT draft_files_draft FOREIGN KEY (draft_id) REFERENCES course_drafts (id) ON DELETE CASCADE,
			CONSTRAINT draft_files_content FOREIGN KEY (hash) REFERENCES file_contents (hash),
			CONSTRAINT draft_files_user FOREIGN KEY (changed_by) REFERENCES users (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE draft_files');
