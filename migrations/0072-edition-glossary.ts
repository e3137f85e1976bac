import type { MigrationStep } from '../src/lib/server/db/migration';

/** The terms of an edition in plain words. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query("ALTER TABLE editions ADD COLUMN glossary JSON NOT NULL DEFAULT '[]'");

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query('ALTER TABLE editions DROP COLUMN glossary');
