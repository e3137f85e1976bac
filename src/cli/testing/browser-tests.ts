import { randomBytes } from 'node:crypto';
import { ensureBuild } from '../app/build';
import { importCourses, migrate, seedIfEmpty, useDatabase } from '../app/database';
import { startBuilt } from '../app/server';
import { requireProgram } from '../ground/debian-package.js';
import { atEnd } from '../ground/ending';
import { step } from '../ground/step.js';
import { anyFreePort } from '../mariadb/free-port';
import { usePrivateServer } from '../mariadb/private-server';
import { dropDatabase, dropDatabasesOfDeadRuns } from '../mariadb/schema';
import { TEST_SERVER } from '../mariadb/servers';
import type { Count } from './count';
import { runPlaywright } from './reports';

const BUILD_FOLDER = '.data/test/build';
const HOST = '127.0.0.1';

/** Builds the application, starts it on a database made for this run, and runs the browser tests against it. */
export const runBrowserTests = (args: string[]): Promise<Count> =>
	withBuiltServer((origin, chromium) => runPlaywright(args, origin, chromium));

/** Builds the application, starts it on a database made for this run, with demo people, and stops it after `use`. */
export async function withBuiltServer<T>(
	use: (origin: string, chromiumPath: string) => Promise<T>
): Promise<T> {
	const chromium = await step('Browser', () => ({ path: findChromium(), note: findChromium() }));
	await step('Build', () => ensureBuild(BUILD_FOLDER));
	await step('Database', openFreshDatabase);
	await step('Migrations', migrate);
	await step('Courses', importCourses);
	await step('Demo data', seedIfEmpty);
	const port = await anyFreePort(HOST);
	const address = { host: HOST, port, origin: `http://${HOST}:${port}` };
	const server = await step('Server', () => startBuilt(BUILD_FOLDER, address));
	try {
		return await use(address.origin, chromium.path);
	} finally {
		await server.stop();
	}
}

const findChromium = (): string => process.env.CHROMIUM ?? requireProgram('chromium', 'chromium');

async function openFreshDatabase(): Promise<string> {
	const server = await usePrivateServer(TEST_SERVER.folder, TEST_SERVER.firstPort);
	atEnd(() => server.release());
	await dropDatabasesOfDeadRuns(server.urlOf('sweepwright_e2e'));
	const databaseUrl = server.urlOf(`sweepwright_e2e_${process.pid}_${randomBytes(4).toString('hex')}`);
	await useDatabase(databaseUrl);
	atEnd(() => dropDatabase(databaseUrl));
	return server.note;
}
