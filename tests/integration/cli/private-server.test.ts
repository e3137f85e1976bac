import { createConnection } from 'mariadb';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { isAlive } from '../../../src/cli/ground/lock.js';
import { freePort } from '../../../src/cli/mariadb/free-port';
import { type PrivateServer, usePrivateServer } from '../../../src/cli/mariadb/private-server';
import { createDatabase } from '../../../src/cli/mariadb/schema';

let base: string;
let folder: string;
let firstPort: number;
const inUse: PrivateServer[] = [];
const take = async () => {
	const server = await usePrivateServer(folder, firstPort);
	inUse.push(server);
	return server;
};

beforeAll(async () => {
	base = mkdtempSync(join(tmpdir(), 'private-server-'));
	folder = join(base, 'a-folder-whose-path-is-longer-than-a-socket-may-have'.repeat(3));
	firstPort = await freePort(23317, '127.0.0.1');
});
afterEach(async () => {
	for (const server of inUse.splice(0)) await server.release();
});
afterAll(() => rmSync(base, { recursive: true }));

const pid = () => Number(readFileSync(join(folder, 'server.pid'), 'utf8'));
const portOf = (server: PrivateServer) => Number(new URL(server.urlOf('sweepwright_kept')).port);

/** First row of a query, asked by the application's own account. */
async function ask(server: PrivateServer, statement: string): Promise<Record<string, unknown>> {
	const { hostname, username, password, port } = new URL(server.urlOf('sweepwright_kept'));
	const connection = await createConnection({
		host: hostname,
		port: Number(port),
		user: username,
		password,
		bigIntAsNumber: true
	});
	try {
		return (await connection.query(statement))[0];
	} finally {
		await connection.end();
	}
}

describe('usePrivateServer(folder, firstPort)', { timeout: 60_000 }, () => {
	it('finds ports for two servers that start at the same moment', async () => {
		const neighbours = ['one', 'two'].map((name) => usePrivateServer(join(base, name), firstPort));
		const servers = await Promise.all(neighbours);
		inUse.push(...servers);
		expect(portOf(servers[0])).not.toBe(portOf(servers[1]));
	});

	it('serves several users and ends with the last of them', async () => {
		const [first, second] = [await take(), await take()];
		expect(portOf(first)).toBe(firstPort);
		expect(portOf(second)).toBe(firstPort);
		const server = pid();
		await createDatabase(first.urlOf('sweepwright_kept'));
		await first.release();
		expect(isAlive(server)).toBe(true);
		await second.release();
		expect(isAlive(server)).toBe(false);
	});

	it('keeps its data, and takes another port where its own is taken', async () => {
		const blocker = createServer();
		await new Promise<void>((resolve) => blocker.listen(firstPort, '127.0.0.1', resolve));
		const server = await take();
		await new Promise((resolve) => blocker.close(resolve));
		expect(portOf(server)).toBeGreaterThan(firstPort);
		const kept = `SELECT COUNT(*) AS kept FROM information_schema.schemata WHERE schema_name = 'sweepwright_kept'`;
		expect(await ask(server, kept)).toEqual({ kept: 1 });
	});

	it('is strict, speaks UTC and utf8mb4, listens to this machine only and loses nothing it has committed', async () => {
		const settings = await ask(
			await take(),
			`SELECT @@innodb_flush_log_at_trx_commit AS flush, @@time_zone AS zone, @@bind_address AS address,
			 @@character_set_server AS charset, @@sql_mode LIKE '%STRICT_ALL_TABLES%' AS strict`
		);
		expect(settings).toEqual({
			flush: 1,
			zone: '+00:00',
			address: '127.0.0.1',
			charset: 'utf8mb4',
			strict: 1
		});
	});

	it("gives the application's account databases named sweepwright_… and no others", async () => {
		await expect(ask(await take(), 'CREATE DATABASE sweepwrightx')).rejects.toThrow(/denied/i);
	});
});
