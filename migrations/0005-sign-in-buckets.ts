import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE sign_in_buckets (
			-- SHA-256 of what is limited: an account, an address or a known device.
			id BINARY(32) NOT NULL PRIMARY KEY,
			-- Tries that have not drained away yet at updated_at.
			level DOUBLE NOT NULL,
			updated_at DATETIME(3) NOT NULL,
			KEY sign_in_buckets_updated_at (updated_at)
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) =>
	queryInterface.dropTable('sign_in_buckets');
