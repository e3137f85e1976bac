import type { MigrationStep } from '../src/lib/server/db/migration';

/** Practice takes no try and never counts. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(
		'ALTER TABLE attempts ADD COLUMN practice BOOLEAN NOT NULL DEFAULT FALSE AFTER number'
	);

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query('ALTER TABLE attempts DROP COLUMN practice');
