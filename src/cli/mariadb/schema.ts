import { type Connection, createConnection } from 'mariadb';
import { isAlive } from '../ground/lock.js';

/** Makes the database that `databaseUrl` names if it isn't there. */
export function createDatabase(databaseUrl: string): Promise<void> {
	return onServer(databaseUrl, (name) => `CREATE DATABASE IF NOT EXISTS ${name}`);
}

/** Drops the database that `databaseUrl` names, with all that is in it. */
export function dropDatabase(databaseUrl: string): Promise<void> {
	return onServer(databaseUrl, (name) => `DROP DATABASE IF EXISTS ${name}`);
}

/** Drops every database named `<prefix>_<process id>_…` whose process is gone; `prefixUrl` names the prefix. */
export async function dropDatabasesOfDeadRuns(prefixUrl: string): Promise<void> {
	const prefix = nameIn(prefixUrl);
	const connection = await connect(prefixUrl);
	try {
		const rows = await connection.query<{ name: string }[]>(
			'SELECT schema_name AS name FROM information_schema.schemata'
		);
		const dead = rows.filter(({ name }) => {
			const [, pid] = new RegExp(`^${prefix}_(\\d+)_`).exec(name) ?? [];
			return pid !== undefined && !isAlive(Number(pid));
		});
		for (const { name } of dead) await connection.query(`DROP DATABASE IF EXISTS ${quote(name)}`);
	} finally {
		await connection.end();
	}
}

async function onServer(databaseUrl: string, statement: (quotedName: string) => string): Promise<void> {
	const connection = await connect(databaseUrl);
	try {
		await connection.query(statement(quote(nameIn(databaseUrl))));
	} finally {
		await connection.end();
	}
}

function connect(databaseUrl: string): Promise<Connection> {
	const { hostname, port, username, password } = new URL(databaseUrl);
	return createConnection({
		host: hostname,
		port: port === '' ? 3306 : Number(port),
		user: decodeURIComponent(username),
		password: decodeURIComponent(password)
	});
}

const nameIn = (databaseUrl: string): string => decodeURIComponent(new URL(databaseUrl).pathname.slice(1));

const quote = (name: string): string => `\`${name.replaceAll('`', '``')}\``;
