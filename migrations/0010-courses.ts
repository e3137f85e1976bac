import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE courses (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			slug VARCHAR(80) NOT NULL,
			created_at DATETIME(3) NOT NULL,
			UNIQUE KEY courses_slug (slug)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE courses');
