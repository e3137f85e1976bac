import { encodeBase32LowerCaseNoPadding } from '@oslojs/encoding';
import { createHash, randomBytes } from 'node:crypto';

const TOKEN_BYTES = 20;

/** A new secret for a cookie: 160 random bits in 32 lower-case letters and digits. */
export const createToken = (): string => encodeBase32LowerCaseNoPadding(randomBytes(TOKEN_BYTES));

/** SHA-256 of a token: what the database keeps in its stead. A token has too many bits to be found from it. */
export const hashToken = (token: string): Buffer => createHash('sha256').update(token).digest();
