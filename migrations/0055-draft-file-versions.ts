import type { MigrationStep } from '../src/lib/server/db/migration';

/** What a draft's file held before, and now: what one person types within minutes is one version. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE draft_file_versions (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			file_id BIGINT UNSIGNED NOT NULL,
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			revision INT UNSIGNED NOT NULL,
			origin VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			note VARCHAR(200) NULL,
			changed_by INT UNSIGNED NOT NULL,
			begun_at DATETIME(3) NOT NULL,
			changed_at DATETIME(3) NOT NULL,
			KEY draft_file_versions_file (file_id, id),
			CONSTRAINT draft_file_versions_file FOREIGN KEY (file_id) REFERENCES draft_files (id) ON DELETE CASCADE,
			CONSTRAINT draft_file_versions_content FOREIGN KEY (hash) REFERENCES file_contents (hash),
			CONSTRAINT draft_file_versions_user FOREIGN KEY (changed_by) REFERENCES users (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE draft_file_versions');
