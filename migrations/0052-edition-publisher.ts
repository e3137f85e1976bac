import type { MigrationStep } from '../src/lib/server/db/migration';

/** Who published an edition; nobody where it came from content/. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		ALTER TABLE editions
			ADD COLUMN published_by INT UNSIGNED NULL,
			ADD CONSTRAINT editions_published_by FOREIGN KEY (published_by) REFERENCES users (id)
	`);

export const down: MigrationStep = ({ context }) =>
	context.sequelize.query(
		'ALTER TABLE editions DROP FOREIGN KEY editions_published_by, DROP COLUMN published_by'
	);
