import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE server_keys (
			-- What the key seals. One key for all processes, made by the first that needs it.
			purpose VARCHAR(40) NOT NULL PRIMARY KEY,
			secret BINARY(32) NOT NULL,
			created_at DATETIME(3) NOT NULL
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) =>
	queryInterface.dropTable('server_keys');
