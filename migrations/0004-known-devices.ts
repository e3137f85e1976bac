import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE known_devices (
			-- SHA-256 of the token that a browser was given when this person first signed in with it.
			id BINARY(32) NOT NULL PRIMARY KEY,
			user_id INT UNSIGNED NOT NULL,
			created_at DATETIME(3) NOT NULL,
			last_used_at DATETIME(3) NOT NULL,
			KEY known_devices_last_used_at (last_used_at),
			CONSTRAINT known_devices_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) =>
	queryInterface.dropTable('known_devices');
