import type { MigrationStep } from '../src/lib/server/db/migration';

export const up: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query('ALTER TABLE users ADD COLUMN last_sign_in_at DATETIME(3) NULL AFTER disabled_at');

export const down: MigrationStep = ({ context: { sequelize } }) =>
	sequelize.query('ALTER TABLE users DROP COLUMN last_sign_in_at');
