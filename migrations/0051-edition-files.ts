import type { MigrationStep } from '../src/lib/server/db/migration';

/** The files that an edition was made of. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE edition_files (
			edition_id BIGINT UNSIGNED NOT NULL,
			path VARCHAR(200) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			PRIMARY KEY (edition_id, path),
			CONSTRAINT edition_files_edition FOREIGN KEY (edition_id) REFERENCES editions (id) ON DELETE CASCADE,
			CONSTRAINT edition_files_content FOREIGN KEY (hash) REFERENCES file_contents (hash)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE edition_files');
