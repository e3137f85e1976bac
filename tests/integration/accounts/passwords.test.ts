import { expect, it } from 'vitest';
import { createGate } from '$lib/server/auth/gate';
import { hashPassword, verifyPassword } from '$lib/server/auth/passwords';

it('hashes with argon2id over 19 MiB, two passes, one lane, and a new salt each time', async () => {
	const [one, other] = [await hashPassword('same'), await hashPassword('same')];
	expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
	expect(one).not.toBe(other);
	expect(await verifyPassword(one, 'same')).toBe(true);
	expect(await verifyPassword(one, 'Same')).toBe(false);
});

it('is never right about nobody’s password', async () => {
	expect(await verifyPassword(undefined, '')).toBe(false);
	expect(await verifyPassword(undefined, 'anything')).toBe(false);
});

it('hashes two at a time, in order, and goes on after a failure', async () => {
	const gate = createGate(2);
	let running = 0;
	let most = 0;
	const order: number[] = [];
	const work = (i: number) =>
		gate(async () => {
			running += 1;
			most = Math.max(most, running);
			order.push(i);
			await new Promise((done) => setTimeout(done, 5));
			running -= 1;
			if (i === 1) throw new Error('one fails');
		});
	const all = await Promise.allSettled([0, 1, 2, 3, 4, 5].map(work));
	expect(most).toBe(2);
	expect(order).toEqual([0, 1, 2, 3, 4, 5]);
	expect(all.map(({ status }) => status)).toEqual(all.map((_, i) => (i === 1 ? 'rejected' : 'fulfilled')));
});
