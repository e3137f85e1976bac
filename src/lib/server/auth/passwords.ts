import { hash, verify } from '@node-rs/argon2';
import { createGate } from './gate';

/** OWASP's first choice for argon2id, which is the library's default algorithm: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 };

/** Hashing takes whole threads: more at once would only make everything else on the server wait. */
const gate = createGate(2);

/** Verified when there is no such account, so that the answer takes as long: the hash of a token nobody kept. */
const NOBODYS_HASH =
	'$argon2id$v=19$m=19456,t=2,p=1$FedXHhfnSv4mRvvOImYa9w$FwkrfGYrIet4inepUYXJGUhCcjpNnqluJfzEZjCnJ5g';

/** The password's argon2id hash with its parameters and a new salt, as text. */
export const hashPassword = (password: string): Promise<string> => gate(() => hash(password, COST));

/** Whether `password` is the one behind `passwordHash`. Without a hash: false, after the same work. */
export const verifyPassword = (passwordHash: string | undefined, password: string): Promise<boolean> =>
	gate(async () => (await verify(passwordHash ?? NOBODYS_HASH, password)) && passwordHash !== undefined);

/** Whether a hash was made with less work than is asked for now, or by another algorithm. */
export function isOutdatedHash(passwordHash: string): boolean {
	const [, memory, time] = /^\$argon2id\$v=19\$m=(\d+),t=(\d+),p=\d+\$/.exec(passwordHash) ?? [];
	return !(Number(memory) >= COST.memoryCost && Number(time) >= COST.timeCost);
}
