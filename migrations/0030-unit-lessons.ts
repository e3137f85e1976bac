import type { MigrationStep } from '../src/lib/server/db/migration';

/** Lessons in parts, with figures between them. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE units
			ADD COLUMN lesson JSON NOT NULL DEFAULT 'null',
			ADD COLUMN figures JSON NOT NULL DEFAULT '[]'
	`);

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query('ALTER TABLE units DROP COLUMN lesson, DROP COLUMN figures');
