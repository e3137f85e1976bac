import { randomBytes } from 'node:crypto';
import { ServerKey } from '$lib/server/db/models/server-key';

const known = new Map<string, Promise<Buffer>>();

/** The 32-byte key for `purpose`, the same in every process; made by whichever asks first. */
export function serverKey(purpose: string): Promise<Buffer> {
	const held = known.get(purpose);
	if (held) return held;
	const found = findOrMake(purpose);
	known.set(purpose, found);
	// A database that was away for a moment must not be remembered as having no key.
	found.catch(() => known.delete(purpose));
	return found;
}

async function findOrMake(purpose: string): Promise<Buffer> {
	const row = { purpose, secret: randomBytes(32), createdAt: new Date() };
	await ServerKey.bulkCreate([row], { ignoreDuplicates: true });
	const key = await ServerKey.findByPk(purpose);
	if (!key) throw new Error(`The key for ${purpose} was made and is not there`);
	return key.secret;
}
