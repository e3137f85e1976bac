import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query(`
		CREATE TABLE user_roles (
			user_id INT UNSIGNED NOT NULL,
			role VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
			created_at DATETIME(3) NOT NULL,
			PRIMARY KEY (user_id, role),
			CONSTRAINT user_roles_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
		)
`);

export const down: MigrationStep = ({ context: { queryInterface } }) =>
	queryInterface.dropTable('user_roles');
