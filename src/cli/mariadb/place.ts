import { createHash, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir, userInfo } from 'node:os';
import { join, resolve } from 'node:path';
import { Refusal } from '../ground/refusal.js';

/** Where one private database server keeps its files, and how to reach it. */
export interface Place {
	folder: string;
	data: string;
	socket: string;
	pidFile: string;
	errorLog: string;
	lock: string;
	leases: string;
	user: string;
}

/** What the server remembers between runs. The password is for the application; root comes in by the socket alone. */
export interface Memory {
	port: number;
	password: string;
}

const LONGEST_SOCKET_BYTES = 100; // The kernel's limit is 107, and the server adds to it.

export function placeIn(relativeFolder: string): Place {
	const folder = resolve(relativeFolder);
	mkdirSync(folder, { recursive: true });
	refuseForeign(folder);
	return {
		folder,
		data: join(folder, 'data'),
		socket: socketPath(folder),
		pidFile: join(folder, 'server.pid'),
		errorLog: join(folder, 'error.log'),
		lock: join(folder, 'lock'),
		leases: join(folder, 'leases'),
		user: userInfo().username
	};
}

/** A socket beside the data, or, where that path is too long, one in the temp folder under a name of its own. */
export function socketPath(folder: string): string {
	const beside = join(folder, 'server.sock');
	if (Buffer.byteLength(beside) <= LONGEST_SOCKET_BYTES) return beside;
	const name = createHash('sha256').update(folder).digest('hex').slice(0, 16);
	return join(tmpdir(), `sweepwright-${name}.sock`);
}

export function recall(place: Place): Memory | undefined {
	const path = memoryFile(place);
	return existsSync(path) ? (JSON.parse(readFileSync(path, 'utf8')) as Memory) : undefined;
}

/** Keeps the port for the next run, with the password, made the first time. */
export function remember(place: Place, port: number): Memory {
	const memory = { port, password: recall(place)?.password ?? randomBytes(24).toString('hex') };
	writeFileSync(memoryFile(place), JSON.stringify(memory), { mode: 0o600 });
	return memory;
}

const memoryFile = (place: Place): string => join(place.folder, 'server.json');

/** The server's root is the user who made the folder; another one could neither read it nor log in. */
function refuseForeign(folder: string): void {
	const owner = statSync(folder).uid;
	if (process.getuid && owner !== process.getuid()) {
		throw new Refusal(`${folder} belongs to user ${owner}: run this as that user, or remove the folder.`);
	}
}
