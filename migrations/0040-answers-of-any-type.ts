import type { MigrationStep } from '../src/lib/server/db/migration';

/** An answer may be other than a number: it is kept whole then, and the number's columns stay empty. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE answers
			MODIFY text VARCHAR(60) NULL,
			MODIFY unit VARCHAR(16) NULL,
			MODIFY value DOUBLE NULL,
			ADD COLUMN typed JSON NULL
	`);

/** Fails, and changes nothing, while there are others than numbers: they have no place in the table as it was. */
export const down: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE answers
			MODIFY text VARCHAR(60) NOT NULL,
			MODIFY unit VARCHAR(16) NOT NULL,
			MODIFY value DOUBLE NOT NULL,
			DROP COLUMN typed
	`);
