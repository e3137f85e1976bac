import type { MigrationStep } from '../src/lib/server/db/migration';

/** What files of courses hold, each once, by the hash of its bytes. Never changed. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE file_contents (
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
			bytes MEDIUMBLOB NOT NULL
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE file_contents');
