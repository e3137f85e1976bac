import { takeTry, type Bucket, type Limit } from '$lib/server/domain/sign-in-limit';
import { addressBlock } from '$lib/server/domain/address-block';
import { DomainError } from '$lib/server/errors';
import { LeastRecentlyUsed } from '../attempts/least-recently-used';

/** Sweeps from one address: a classroom behind one may look at once, and nobody can have the receiver to himself. */
const SWEEPS: Limit = { capacity: 120, drainS: 1 / 20 };
/** Answers are graded, which takes as much work as some hundred sweeps. */
const ANSWERS: Limit = { capacity: 10, drainS: 6 };

// By process: what is limited is this process's time, and nothing about a visitor is stored.
const buckets = new LeastRecentlyUsed<string, { bucket: Bucket }>(10_000);

function spend(what: string, limit: Limit, address: string, now: Date): void {
	const held = buckets.get(`${what} ${addressBlock(address)}`, () => ({
		bucket: { level: 0, updatedAt: now }
	}));
	const { retryAfterS, bucket } = takeTry(held.bucket, limit, now);
	if (retryAfterS > 0) {
		const message = `Too much at once from your address. Go on in ${retryAfterS} s.`;
		throw new DomainError('too_many', message, { retryAfterS });
	}
	held.bucket = bucket;
}

/** @throws DomainError `too_many` with when to come back */
export const spendSweep = (address: string, now: Date): void => spend('sweep', SWEEPS, address, now);
/** @throws DomainError `too_many` with when to come back */
export const spendAnswer = (address: string, now: Date): void => spend('answer', ANSWERS, address, now);
