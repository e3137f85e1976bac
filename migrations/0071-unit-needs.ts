import type { MigrationStep } from '../src/lib/server/db/migration';

/** What a unit needs first, and with how many exercises right it is done; null is all of them. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(
		"ALTER TABLE units ADD COLUMN needs JSON NOT NULL DEFAULT '[]', ADD COLUMN done_with INT UNSIGNED NULL"
	);

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query('ALTER TABLE units DROP COLUMN needs, DROP COLUMN done_with');
