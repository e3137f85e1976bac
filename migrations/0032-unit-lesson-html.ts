import type { MigrationStep } from '../src/lib/server/db/migration';

/** The parts hold it now. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query('ALTER TABLE units DROP COLUMN lesson_html');

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query("ALTER TABLE units ADD COLUMN lesson_html MEDIUMTEXT NOT NULL DEFAULT ''");
