import type { MigrationStep } from '../src/lib/server/db/migration';

/** A reading may be a count: it has a bench clock, and nothing that tells of a trace. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE readings
			MODIFY trace INT UNSIGNED NULL,
			MODIFY mode VARCHAR(16) NULL,
			MODIFY trace_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
			ADD COLUMN clock_s DOUBLE NULL
	`);

/** Fails, and changes nothing, while there are counts: they have no place in the table as it was. */
export const down: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE readings
			MODIFY trace INT UNSIGNED NOT NULL,
			MODIFY mode VARCHAR(16) NOT NULL,
			MODIFY trace_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			DROP COLUMN clock_s
	`);
