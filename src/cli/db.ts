/** `npm run db:migrate|db:rollback|db:seed|db:reset`, on the private database or the one that DATABASE_URL names. */
import {
	connection,
	importCourses,
	isEmpty,
	loadMigrations,
	migrate,
	openDatabase,
	seedIfEmpty,
	useDatabase
} from './app/database';
import { runCommand } from './ground/ending';
import { Refusal } from './ground/refusal.js';
import { describeRunning, findRunning } from './ground/running.js';
import { step } from './ground/step.js';
import { dropDatabase } from './mariadb/schema';

const actions: Record<string, (isPrivate: boolean) => Promise<void>> = {
	migrate: async () => {
		await step('Migrations', migrate);
	},
	rollback: async () => {
		await step('Rollback', rollback);
	},
	seed: async () => {
		await step('Migrations', migrate);
		await step('Courses', importCourses);
		if (!(await isEmpty()))
			throw new Refusal('There are people in this database: the demo data goes into an empty one only.');
		await step('Demo data', seedIfEmpty);
	},
	reset: async (isPrivate) => {
		if (!isPrivate)
			throw new Refusal('Only the private database can be thrown away; DATABASE_URL names another.');
		const running = findRunning('start') ?? findRunning('dev');
		if (running) throw new Refusal(`${describeRunning(running)} End it first.`);
		await step('Reset', dropPrivate);
		await actions.seed(isPrivate);
	}
};

await runCommand(async () => {
	const action = actions[process.argv[2]];
	if (!action) throw new Refusal(`One of: ${Object.keys(actions).join(', ')}`);
	const { isPrivate } = await step('Database', openDatabase);
	await action(isPrivate);
	return 0;
});

async function rollback(): Promise<string> {
	const { migrateDown } = await import('$lib/server/db/migrate');
	const [name] = await migrateDown(await connection(), await loadMigrations());
	return name ? `took back ${name}` : 'nothing to take back';
}

async function dropPrivate(): Promise<string> {
	const databaseUrl = String(process.env.DATABASE_URL);
	await dropDatabase(databaseUrl);
	await useDatabase(databaseUrl);
	return 'private database thrown away and made anew';
}
