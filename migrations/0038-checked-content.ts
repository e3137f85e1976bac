import type { MigrationStep } from '../src/lib/server/db/migration';

/** What of content/ has been checked, by the hash of its files: what stands here needs no checking again. */
export const up: MigrationStep = async ({ context }) => {
	await context.sequelize.query(`
		CREATE TABLE checked_content (
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
			edition_id BIGINT UNSIGNED NULL,
			definition JSON NULL,
			checked_at DATETIME(3) NOT NULL,
			CONSTRAINT checked_content_edition FOREIGN KEY (edition_id) REFERENCES editions (id) ON DELETE CASCADE
		)
	`);
};

export const down: MigrationStep = async ({ context }) => {
	await context.sequelize.query('DROP TABLE checked_content');
};
