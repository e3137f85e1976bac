import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE exercises (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			edition_id BIGINT UNSIGNED NOT NULL,
			unit_id BIGINT UNSIGNED NOT NULL,
			number INT UNSIGNED NOT NULL,
			slug VARCHAR(80) NOT NULL,
			title VARCHAR(300) NOT NULL,
			definition JSON NOT NULL,
			situation_html TEXT NOT NULL,
			tries INT UNSIGNED NOT NULL,
			UNIQUE KEY exercises_unit_number (unit_id, number),
			UNIQUE KEY exercises_edition_slug (edition_id, slug),
			KEY exercises_slug (slug),
			CONSTRAINT exercises_edition FOREIGN KEY (edition_id) REFERENCES editions (id),
			CONSTRAINT exercises_unit FOREIGN KEY (unit_id) REFERENCES units (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE exercises');
