/** Names by which a machine calls itself. */
const LOOPBACK = ['localhost', '127.0.0.1', '[::1]'];

/**
 * Our own address, when a page was asked for by another name of this machine: forms are accepted from one origin only,
 * and a person who typed `localhost` would be refused at the first of them. Null for any other name.
 * @param host the request's Host header
 * @param origin our origin, such as http://127.0.0.1:3000
 */
export function properOrigin(host: string | null, origin: string): string | null {
	const ours = new URL(origin);
	if (host === null || host === ours.host || !LOOPBACK.includes(ours.hostname)) return null;
	return LOOPBACK.some((name) => host === (ours.port ? `${name}:${ours.port}` : name)) ? ours.origin : null;
}
