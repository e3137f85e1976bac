import { Refusal } from '../ground/refusal.js';
import { freePort, isPortFree } from '../mariadb/free-port';

export interface Address {
	host: string;
	port: number;
	/** What people type, and what forms are accepted from. */
	origin: string;
}

/**
 * Where a server is to listen, from HOST, PORT and ORIGIN. A port that was asked for must be free;
 * otherwise the first free one from `firstPort` on.
 */
export async function chooseAddress(env: NodeJS.ProcessEnv, firstPort: number): Promise<Address> {
	const host = env.HOST || '127.0.0.1';
	if (env.PORT && !/^\d{1,5}$/.test(env.PORT))
		throw new Refusal(`PORT must be a port number, got ${env.PORT}`);
	const port = env.PORT ? Number(env.PORT) : await freePort(firstPort, host);
	if (env.PORT && !(await isPortFree(port, host))) {
		throw new Refusal(`Port ${port} of ${host} is taken by another program: give another PORT.`);
	}
	return { host, port, origin: env.ORIGIN || `http://${reachable(host)}:${port}` };
}

/** A name under which this machine reaches a server that listens on `host`. */
export function reachable(host: string): string {
	if (host === '0.0.0.0' || host === '::') return 'localhost';
	return host.includes(':') ? `[${host}]` : host;
}
