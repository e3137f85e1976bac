import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE sessions (
			-- SHA-256 of the token in the cookie. The token itself is nowhere in the database.
			id BINARY(32) NOT NULL PRIMARY KEY,
			user_id INT UNSIGNED NOT NULL,
			created_at DATETIME(3) NOT NULL,
			expires_at DATETIME(3) NOT NULL,
			KEY sessions_expires_at (expires_at),
			CONSTRAINT sessions_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) => queryInterface.dropTable('sessions');
