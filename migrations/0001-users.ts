import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE users (
			id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			-- As normalised by normaliseEmail. Compared byte by byte: two addresses that only look alike are two people.
			email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
			display_name VARCHAR(120) NOT NULL,
			password_hash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			disabled_at DATETIME(3) NULL,
			created_at DATETIME(3) NOT NULL,
			updated_at DATETIME(3) NOT NULL,
			UNIQUE KEY users_email (email)
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) => queryInterface.dropTable('users');
