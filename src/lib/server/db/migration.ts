import type { QueryInterface, Sequelize } from 'sequelize';

export interface MigrationContext {
	queryInterface: QueryInterface;
	sequelize: Sequelize;
}

export type MigrationStep = (params: { context: MigrationContext }) => Promise<unknown>;

/**
 * One file of `migrations/`, named NNNN-what.ts: exports `up` and `down`.
 * MariaDB's DDL isn't transactional: a step that fails half-way leaves what it made, so keep each file to one thing.
 * `queryInterface.removeColumn` fails with this driver: drop columns with `sequelize.query('ALTER TABLE … DROP COLUMN …')`.
 */
export interface Migration {
	up: MigrationStep;
	down: MigrationStep;
}
