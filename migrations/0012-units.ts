import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE units (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			edition_id BIGINT UNSIGNED NOT NULL,
			number INT UNSIGNED NOT NULL,
			slug VARCHAR(80) NOT NULL,
			title VARCHAR(300) NOT NULL,
			summary VARCHAR(300) NOT NULL,
			lesson_html MEDIUMTEXT NOT NULL,
			UNIQUE KEY units_edition_number (edition_id, number),
			UNIQUE KEY units_edition_slug (edition_id, slug),
			CONSTRAINT units_edition FOREIGN KEY (edition_id) REFERENCES editions (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE units');
