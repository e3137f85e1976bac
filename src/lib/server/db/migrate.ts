import { QueryTypes, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import type { Migration, MigrationContext } from './migration';

/** Migration files by path, as `import.meta.glob('/migrations/*.ts', { eager: true })` and the command line give them. */
export type MigrationFiles = Record<string, Migration>;

const LOCK = 'sweepwright-migrations';
const LOCK_WAIT_S = 120;

const nameOf = (path: string): string => path.replace(/^.*\//, '').replace(/\.[jt]s$/, '');

/** Umzug over `files`, in the order of their names; what has run is kept in the table `migrations`. */
export function createMigrator(sequelize: Sequelize, files: MigrationFiles): Umzug<MigrationContext> {
	return new Umzug<MigrationContext>({
		migrations: Object.entries(files)
			.map(([path, { up, down }]) => ({ name: nameOf(path), up, down }))
			.sort((a, b) => (a.name < b.name ? -1 : 1)),
		context: { sequelize, queryInterface: sequelize.getQueryInterface() },
		storage: new SequelizeStorage({ sequelize, modelName: 'migration', tableName: 'migrations' }),
		logger: undefined
	});
}

/** Runs what has not run yet, one process at a time. Returns the names of what it ran. */
export function migrateUp(sequelize: Sequelize, files: MigrationFiles): Promise<string[]> {
	return underLock(sequelize, async () => namesOf(await createMigrator(sequelize, files).up()));
}

/** Takes back the last migration that ran, or all of them. Returns the names of what it took back. */
export function migrateDown(sequelize: Sequelize, files: MigrationFiles, all = false): Promise<string[]> {
	return underLock(sequelize, async () =>
		namesOf(await createMigrator(sequelize, files).down(all ? { to: 0 } : {}))
	);
}

const namesOf = (done: { name: string }[]): string[] => done.map(({ name }) => name);

/** The lock belongs to a connection, and only a transaction keeps its connection: hence the otherwise empty one. */
async function underLock<T>(sequelize: Sequelize, work: () => Promise<T>): Promise<T> {
	return sequelize.transaction(async (transaction) => {
		const [{ got }] = await sequelize.query<{ got: number | null }>(
			`SELECT GET_LOCK(CONCAT('${LOCK}/', DATABASE()), ${LOCK_WAIT_S}) AS got`,
			{ type: QueryTypes.SELECT, transaction }
		);
		if (got !== 1) throw new Error(`Another process has been migrating this database for ${LOCK_WAIT_S} s`);
		try {
			return await work();
		} finally {
			await sequelize.query(`SELECT RELEASE_LOCK(CONCAT('${LOCK}/', DATABASE()))`, {
				type: QueryTypes.SELECT,
				transaction
			});
		}
	});
}
