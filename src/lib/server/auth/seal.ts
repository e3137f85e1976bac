import { decodeBase64urlIgnorePadding, encodeBase64urlNoPadding } from '@oslojs/encoding';
import { createCipheriv, createDecipheriv, randomBytes } from 'node:crypto';
import { serverKey } from './server-key';

const NONCE_BYTES = 12;
const TAG_BYTES = 16;

/** What may be given away sealed: nobody outside can read or change it, and it runs out. */
export interface Sealed {
	text: string;
	expiresAt: Date;
}

/** Seals a text for `purpose` (AES-256-GCM, NIST SP 800-38D, a random nonce of 96 bits each time). */
export async function seal(purpose: string, { text, expiresAt }: Sealed): Promise<string> {
	const nonce = randomBytes(NONCE_BYTES);
	const cipher = createCipheriv('aes-256-gcm', await serverKey(purpose), nonce);
	const plain = JSON.stringify([expiresAt.getTime(), text]);
	const sealed = Buffer.concat([cipher.update(plain, 'utf8'), cipher.final()]);
	return encodeBase64urlNoPadding(Buffer.concat([nonce, cipher.getAuthTag(), sealed]));
}

/** The text that was sealed for `purpose`; null for anything else, and once it has run out. */
export async function unseal(purpose: string, token: string, now: Date): Promise<string | null> {
	const key = await serverKey(purpose);
	try {
		const bytes = Buffer.from(decodeBase64urlIgnorePadding(token));
		const decipher = createDecipheriv('aes-256-gcm', key, bytes.subarray(0, NONCE_BYTES));
		decipher.setAuthTag(bytes.subarray(NONCE_BYTES, NONCE_BYTES + TAG_BYTES));
		const plain = Buffer.concat([decipher.update(bytes.subarray(NONCE_BYTES + TAG_BYTES)), decipher.final()]);
		const [expiresAt, text] = JSON.parse(plain.toString('utf8')) as [number, string];
		return expiresAt > now.getTime() ? text : null;
	} catch {
		// Whatever can't be opened was never sealed by us: there is nothing to tell apart and nothing to report.
		return null;
	}
}
