import { setTimeout as sleep } from 'node:timers/promises';
import { type Child, startNode } from '../ground/child';
import { type Address, reachable } from './address';

const READY_LIMIT_S = 60;

/** Starts the production build in `folder` and waits until its front page answers. */
export async function startBuilt(folder: string, { host, port, origin }: Address): Promise<Child> {
	const env = {
		NODE_ENV: 'production',
		HOST: host,
		PORT: String(port),
		ORIGIN: origin,
		// A course comes in as a zip; whatever else reads a body has a limit of its own.
		BODY_SIZE_LIMIT: process.env.BODY_SIZE_LIMIT ?? '13M',
		// Streams of sweeps would hold up the end for half a minute.
		SHUTDOWN_TIMEOUT: process.env.SHUTDOWN_TIMEOUT ?? '3'
	};
	const server = startNode([folder], env, ['inherit', 'pipe', 'inherit']);
	await untilListening(server);
	await untilReady(server, `http://${reachable(host)}:${port}/`);
	return server;
}

/**
 * Waits until the server says itself that it listens: an answer alone might be another's, on the same port.
 * Passes on all else that it says.
 */
function untilListening(server: Child): Promise<void> {
	return new Promise((resolve, reject) => {
		server.process.stdout?.on('data', (chunk: Buffer) => {
			const said = chunk.toString();
			const rest = said.replace(/^Listening on .*\n/m, '');
			if (rest !== said) resolve();
			if (rest !== '') process.stdout.write(rest);
		});
		server.ended.then(
			(code) => reject(new Error(`The server ended with ${code} before it listened`)),
			reject
		);
	});
}

/** Waits for an answer of any kind but a server's error. */
export async function untilReady(server: Child, url: string): Promise<void> {
	let endedWith: number | undefined;
	void server.ended.then((code) => (endedWith = code));
	const giveUpMs = performance.now() + READY_LIMIT_S * 1000;
	while (endedWith === undefined && performance.now() < giveUpMs) {
		const status = await statusOf(url);
		if (status !== undefined && status >= 500) throw new Error(`The server answers ${url} with ${status}`);
		if (status !== undefined) return;
		await sleep(100);
	}
	if (endedWith !== undefined) throw new Error(`The server ended with ${endedWith} before it answered`);
	throw new Error(`The server did not answer ${url} within ${READY_LIMIT_S} s`);
}

/** Nothing while nobody listens yet. */
async function statusOf(url: string): Promise<number | undefined> {
	try {
		const response = await fetch(url, { redirect: 'manual', signal: AbortSignal.timeout(30_000) });
		await response.arrayBuffer();
		return response.status;
	} catch (error) {
		if (error instanceof TypeError) return undefined; // Connection refused.
		throw error;
	}
}
