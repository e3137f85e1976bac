import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { requireProgram } from '../ground/debian-package.js';
import { isAlive } from '../ground/lock.js';
import { freePort } from './free-port';
import { type Memory, type Place, recall, remember } from './place';

const HOST = '127.0.0.1';
const PACKAGE = 'mariadb-server';
const START_LIMIT_S = 60; // After a crash it replays its log first.
const PORT_TRIES = 10;
const STOP_LIMIT_S = 60;

/** Whether a server answers at this place. */
export function answers({ socket }: Place): boolean {
	const admin = requireProgram('mariadb-admin', PACKAGE);
	return spawnSync(admin, ['--no-defaults', '--connect-timeout=5', '-S', socket, 'ping']).status === 0;
}

/** Makes the data folder if there is none. Made aside and moved into place, so that a half-made one is never taken for whole. */
export function install({ data, user }: Place): void {
	if (existsSync(data)) return;
	const unfinished = `${data}.unfinished`;
	rmSync(unfinished, { recursive: true, force: true });
	run(requireProgram('mariadb-install-db', PACKAGE), [
		'--no-defaults',
		`--datadir=${unfinished}`,
		`--user=${user}`,
		'--auth-root-authentication-method=socket',
		`--auth-root-socket-user=${user}`,
		'--skip-test-db',
		'--skip-name-resolve'
	]);
	renameSync(unfinished, data);
}

/** Starts the server and waits until it answers; on the port it had last time, or the next one that it can have. */
export async function start(place: Place, firstPort: number): Promise<Memory> {
	let port = recall(place)?.port ?? firstPort;
	for (let tries = 0; tries < PORT_TRIES; tries++, port++) {
		port = await freePort(port, HOST);
		const memory = remember(place, port);
		if (await startOn(place, memory)) {
			allowApplication(place, memory);
			return memory;
		}
		// Somebody took the port between the look and the start: on to the next.
	}
	throw new Error(`mariadbd found no port for itself:\n${logOf(place)}`);
}

/** False if the port was taken meanwhile. */
async function startOn(place: Place, { port }: Memory): Promise<boolean> {
	rmSync(place.errorLog, { force: true });
	// In a process group of its own: Ctrl-C at the terminal must not reach it.
	const daemon = spawn(requireProgram('mariadbd', PACKAGE), serverOptions(place, port), {
		detached: true,
		stdio: 'ignore'
	});
	daemon.unref();
	await until(START_LIMIT_S, () => daemon.exitCode !== null || answers(place));
	if (daemon.exitCode === null) return true;
	if (logOf(place).includes('Bind on TCP/IP port')) return false;
	throw new Error(`mariadbd ended with ${daemon.exitCode}:\n${logOf(place)}`);
}

function serverOptions(place: Place, port: number): string[] {
	return [
		'--no-defaults', // Must be the first, or /etc/mysql is read.
		`--user=${place.user}`,
		`--datadir=${place.data}`,
		`--socket=${place.socket}`,
		`--pid-file=${place.pidFile}`,
		`--log-error=${place.errorLog}`,
		`--bind-address=${HOST}`,
		`--port=${port}`,
		'--skip-name-resolve',
		'--character-set-server=utf8mb4',
		'--collation-server=utf8mb4_unicode_ci',
		'--default-time-zone=+00:00',
		'--sql-mode=STRICT_ALL_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION',
		'--max-connections=200',
		'--innodb-buffer-pool-size=128M',
		'--innodb-flush-log-at-trx-commit=1'
	];
}

/** Stops the server cleanly and waits until it is gone. */
export async function stop({ pidFile }: Place): Promise<void> {
	if (!existsSync(pidFile)) return;
	const pid = Number(readFileSync(pidFile, 'utf8'));
	process.kill(pid, 'SIGTERM');
	await until(STOP_LIMIT_S, () => !isAlive(pid));
}

/** An underscore is a wildcard in GRANT, hence the backslash. */
function allowApplication({ socket, user }: Place, { password }: Memory): void {
	const accounts = [`'sweepwright'@'${HOST}'`, `'sweepwright'@'localhost'`];
	const statements = accounts.flatMap((account) => [
		`CREATE USER IF NOT EXISTS ${account} IDENTIFIED BY '${password}'`,
		`ALTER USER ${account} IDENTIFIED BY '${password}'`,
		`GRANT ALL ON \`sweepwright\\_%\`.* TO ${account}`
	]);
	run(
		requireProgram('mariadb', PACKAGE),
		['--no-defaults', '-S', socket, '-u', user],
		statements.join(';\n')
	);
}

function run(command: string, args: string[], input?: string): void {
	const { status, stdout, stderr, error } = spawnSync(command, args, { input, encoding: 'utf8' });
	if (status !== 0) throw new Error(`${command} ended with ${status}: ${error?.message ?? stdout + stderr}`);
}

const logOf = ({ errorLog }: Place): string =>
	existsSync(errorLog) ? readFileSync(errorLog, 'utf8').split('\n').slice(-15).join('\n') : '(no log)';

async function until(limitS: number, isSo: () => boolean): Promise<void> {
	const giveUpMs = performance.now() + limitS * 1000;
	while (!isSo()) {
		if (performance.now() > giveUpMs)
			throw new Error(`The database server did not do as told within ${limitS} s`);
		await sleep(30);
	}
}
