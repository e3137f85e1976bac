import type { Child } from '../ground/child';
import { atEnd, runCommand } from '../ground/ending';
import { forgetRunning, noteRunning } from '../ground/running.js';
import { step } from '../ground/step.js';
import { type Address, chooseAddress } from './address';
import { importCourses, migrate, openDatabase, seedIfEmpty } from './database';
import { listDemoSignIns } from './demo-sign-ins';

export interface Kind {
	verb: 'start' | 'dev';
	firstPort: number;
	/** What must be made before the server can start. */
	build?: () => Promise<string>;
	start(address: Address): Promise<Child>;
}

/** From a fresh clone to a running server, one printed step after the other; ends on Ctrl-C, or with the server. */
export function serve({ verb, firstPort, build, start }: Kind): Promise<void> {
	return runCommand(async () => {
		noteRunning({ pid: process.pid, verb });
		atEnd(() => forgetRunning(verb));
		const database = await step('Database', openDatabase);
		await step('Migrations', migrate);
		await step('Courses', importCourses);
		if (database.isPrivate) await step('Demo data', seedIfEmpty);
		if (build) await step('Build', build);
		const address = await chooseAddress(process.env, firstPort);
		process.env.ORIGIN = address.origin;
		const server = await step('Server', () => start(address));
		noteRunning({ pid: process.pid, verb, address: address.origin });
		console.log(await welcome(address, database.isPrivate));
		return server.ended;
	});
}

async function welcome({ origin }: Address, isPrivate: boolean): Promise<string> {
	const signIns = await listDemoSignIns();
	const lines = ['', `Open ${origin}`, ''];
	if (signIns.length > 0) lines.push('Demo sign-ins:', ...signIns, '');
	else if (!isPrivate) lines.push('For demo data in an empty database of your own: npm run db:seed', '');
	return [...lines, 'Ctrl-C ends it.', ''].join('\n');
}
