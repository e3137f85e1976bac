import { readdirSync } from 'node:fs';
import { DataTypes, QueryTypes } from 'sequelize';
import { describe, expect, it } from 'vitest';
import { createSequelize, sequelize } from '$lib/server/db/connection';
import { migrateDown, migrateUp, type MigrationFiles } from '$lib/server/db/migrate';
import type { Migration } from '$lib/server/db/migration';

const files = import.meta.glob<Migration>('/migrations/*.ts', { eager: true });
const tables = async () =>
	(
		await sequelize.query<{ name: string }>(
			'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE()',
			{
				type: QueryTypes.SELECT
			}
		)
	).map(({ name }) => name);
const creating = (table: string): Migration => ({
	up: ({ context }) =>
		context.queryInterface.createTable(table, { id: { type: DataTypes.INTEGER, primaryKey: true } }),
	down: ({ context }) => context.queryInterface.dropTable(table)
});

describe('the migrations of this repository', () => {
	it('are named NNNN-what, no number twice', () => {
		const names = readdirSync('migrations');
		expect(names.filter((name) => !/^\d{4}-[a-z0-9-]+\.ts$/.test(name))).toEqual([]);
		expect(new Set(names.map((name) => name.slice(0, 4))).size).toBe(names.length);
	});

	it('go down to nothing and up again to the same tables', async () => {
		const before = await tables();
		const down = await migrateDown(sequelize, files, true);
		expect(down).toHaveLength(Object.keys(files).length);
		expect(await tables()).toEqual(['migrations']);
		await migrateUp(sequelize, files);
		expect(await tables()).toEqual(before);
	});
});

describe('migrateUp and migrateDown', () => {
	const extra: MigrationFiles = { ...files, '/m/9001-b.ts': creating('b'), '/m/9000-a.ts': creating('a') };

	it('run each file once, in the order of their names', async () => {
		expect(await migrateUp(sequelize, extra)).toEqual(['9000-a', '9001-b']);
		expect(await migrateUp(sequelize, extra)).toEqual([]);
	});

	it('take back the last one only', async () => {
		expect(await migrateDown(sequelize, extra)).toEqual(['9001-b']);
		expect(await tables()).toContain('a');
		expect(await migrateDown(sequelize, extra)).toEqual(['9000-a']);
	});

	it('let one process run them while the other waits', async () => {
		const other = createSequelize(process.env.DATABASE_URL);
		const ran = await Promise.all([migrateUp(sequelize, extra), migrateUp(other, extra)]);
		await other.close();
		expect(ran.map((names) => names.length).sort()).toEqual([0, 2]);
		await migrateDown(sequelize, extra);
		await migrateDown(sequelize, extra);
	});

	it('stop at a migration that fails and keep it as not run', async () => {
		const failing: Migration = {
			up: () => Promise.reject(new Error('planted')),
			down: () => Promise.resolve()
		};
		await expect(migrateUp(sequelize, { ...files, '/m/9002-f.ts': failing })).rejects.toThrow('planted');
		expect(await migrateUp(sequelize, { ...files, '/m/9002-f.ts': creating('f') })).toEqual(['9002-f']);
		await migrateDown(sequelize, { ...files, '/m/9002-f.ts': creating('f') });
	});
});
