import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE saved_set_ups (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			user_id INT UNSIGNED NOT NULL,
			name VARCHAR(60) NOT NULL,
			settings JSON NOT NULL,
			saved_at DATETIME(3) NOT NULL,
			UNIQUE KEY saved_set_ups_name (user_id, name),
			CONSTRAINT saved_set_ups_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE saved_set_ups');
