import { type AddressInfo, createServer } from 'node:net';

/** Whether nobody listens on this port of `host`. */
export function isPortFree(port: number, host: string): Promise<boolean> {
	return new Promise((resolve, reject) => {
		const server = createServer();
		server.once('error', (error: NodeJS.ErrnoException) => {
			if (error.code === 'EADDRINUSE' || error.code === 'EACCES') resolve(false);
			else reject(error);
		});
		server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
	});
}

/** The first free port from `firstPort` on, of a hundred. */
export async function freePort(firstPort: number, host: string): Promise<number> {
	for (let port = firstPort; port < firstPort + 100; port++) {
		if (await isPortFree(port, host)) return port;
	}
	throw new Error(`No free port on ${host} from ${firstPort} to ${firstPort + 99}`);
}

/** A port that the system picks: nobody else is likely to have it in mind. */
export function anyFreePort(host: string): Promise<number> {
	return new Promise((resolve, reject) => {
		const server = createServer();
		server.once('error', reject);
		server.listen({ port: 0, host }, () => {
			const { port } = server.address() as AddressInfo;
			server.close(() => resolve(port));
		});
	});
}
