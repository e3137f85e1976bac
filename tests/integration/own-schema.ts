/** Gives each test file a database of its own, made by the real migrations, as DATABASE_URL; drops it afterwards. */
import { randomBytes } from 'node:crypto';
import { afterAll, inject } from 'vitest';
import type { Migration } from '$lib/server/db/migration';
import { createDatabase, dropDatabase } from '../../src/cli/mariadb/schema';

const name = `sweepwright_test_${process.pid}_${randomBytes(4).toString('hex')}`;
const databaseUrl = inject('databaseUrlPattern').replace('NAME', name);
process.env.DATABASE_URL = databaseUrl;
await createDatabase(databaseUrl);

// Imported only now: the pool takes its address from the environment when it is made.
const { sequelize } = await import('$lib/server/db/connection');
const { migrateUp } = await import('$lib/server/db/migrate');
await migrateUp(sequelize, import.meta.glob<Migration>('/migrations/*.ts', { eager: true })).catch(
	(error: Error) => {
		// The runner prints all that hangs on an error, and the driver hangs the statement on it five times.
		throw new Error(error.message);
	}
);

afterAll(async () => {
	await sequelize.close();
	await dropDatabase(databaseUrl);
});
