import type { MigrationStep } from '../src/lib/server/db/migration';

/** What the proof of an exercise came to, by the hash of its text under the engine's version. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE exercise_proofs (
			hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
			seeds INT UNSIGNED NOT NULL,
			passed BOOLEAN NOT NULL,
			result JSON NOT NULL,
			made_at DATETIME(3) NOT NULL,
			took_ms INT UNSIGNED NOT NULL
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE exercise_proofs');
