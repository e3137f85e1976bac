import type { MigrationStep } from '../src/lib/server/db/migration';

/** What people put by of their benches: each entry holds all that it shows, whatever becomes of its attempt. */
export const up: MigrationStep = ({ context }) =>
	context.sequelize.query(`
		CREATE TABLE logbook_entries (
			id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
			user_id INT UNSIGNED NOT NULL,
			attempt_id BIGINT UNSIGNED NOT NULL,
			kind VARCHAR(10) NOT NULL,
			reading_id BIGINT UNSIGNED NULL,
			exercise VARCHAR(80) NOT NULL,
			words TEXT NOT NULL,
			content JSON NOT NULL,
			note VARCHAR(1000) NOT NULL,
			kept_at DATETIME(3) NOT NULL,
			UNIQUE KEY logbook_entries_reading (user_id, reading_id),
			KEY logbook_entries_kept (user_id, kept_at),
			CONSTRAINT logbook_entries_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE,
			CONSTRAINT logbook_entries_attempt FOREIGN KEY (attempt_id) REFERENCES attempts (id),
			CONSTRAINT logbook_entries_reading_of FOREIGN KEY (reading_id) REFERENCES readings (id)
		)
	`);

export const down: MigrationStep = ({ context }) => context.sequelize.query('DROP TABLE logbook_entries');
