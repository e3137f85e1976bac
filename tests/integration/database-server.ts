/** Starts (or finds) the tests' own MariaDB before the first integration test and lets go of it after the last. */
import type { TestProject } from 'vitest/node';
import { usePrivateServer } from '../../src/cli/mariadb/private-server';
import { dropDatabasesOfDeadRuns } from '../../src/cli/mariadb/schema';
import { TEST_SERVER } from '../../src/cli/mariadb/servers';

declare module 'vitest' {
	export interface ProvidedContext {
		/** Address of a database on the tests' server, with NAME where its name belongs. */
		databaseUrlPattern: string;
	}
}

export default async function setUp(project: TestProject) {
	const server = await usePrivateServer(TEST_SERVER.folder, TEST_SERVER.firstPort);
	await dropDatabasesOfDeadRuns(server.urlOf('sweepwright_test'));
	project.provide('databaseUrlPattern', server.urlOf('NAME'));
	return () => server.release();
}
