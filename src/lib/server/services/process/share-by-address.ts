import { addressBlock } from '$lib/server/domain/address-block';
import { takeTry, type Bucket, type Limit } from '$lib/server/domain/sign-in-limit';
import { DomainError } from '$lib/server/errors';
import { LeastRecentlyUsed } from './least-recently-used';

/**
 * Shares this process's time among network addresses, behind each of which a whole training room may sit. Kept in memory:
 * it is this process's time that is shared, and nothing about a visitor is stored.
 */
export class ShareByAddress {
	readonly #buckets = new LeastRecentlyUsed<string, { bucket: Bucket }>(10_000);

	/** @param what is asked for too often, in words: "figures" */
	constructor(
		readonly what: string,
		readonly limit: Limit
	) {}

	/** @throws DomainError `too_many` with when to come back */
	spend(address: string, now: Date): void {
		const held = this.#buckets.get(addressBlock(address), () => ({ bucket: { level: 0, updatedAt: now } }));
		const { retryAfterS, bucket } = takeTry(held.bucket, this.limit, now);
		if (retryAfterS > 0) {
			const message = `Too many ${this.what} at once. The next one is possible in ${retryAfterS} s.`;
			throw new DomainError('too_many', message, { retryAfterS });
		}
		held.bucket = bucket;
	}
}
