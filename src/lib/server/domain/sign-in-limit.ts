/**
 * A bucket that each try fills by one and that drains steadily. Never full for longer than one try takes to drain,
 * so whoever is refused is refused for seconds, however long somebody else has been guessing.
 */
export interface Bucket {
	level: number;
	updatedAt: Date;
}

export interface Limit {
	/** Tries that may come at once. */
	capacity: number;
	/** Seconds in which one try drains. */
	drainS: number;
}

export interface Taken {
	/** 0 when the try may go ahead; otherwise whole seconds until one may. */
	retryAfterS: number;
	bucket: Bucket;
}

/** Tries against one account from browsers that have never signed in to it. */
export const ACCOUNT_LIMIT: Limit = { capacity: 10, drainS: 30 };
/** Tries from a browser that has signed in to this account before: nobody else can use these up. */
export const DEVICE_LIMIT: Limit = { capacity: 10, drainS: 30 };
/** Failures from one address, behind which a whole training room may sit. */
export const ADDRESS_LIMIT: Limit = { capacity: 30, drainS: 10 };

const levelAt = (bucket: Bucket, limit: Limit, now: Date): number =>
	Math.max(0, bucket.level - (now.getTime() - bucket.updatedAt.getTime()) / 1000 / limit.drainS);

/** Puts one try into the bucket, or refuses and leaves the bucket as it is. */
export function takeTry(bucket: Bucket, limit: Limit, now: Date): Taken {
	const level = levelAt(bucket, limit, now);
	const excess = level + 1 - limit.capacity;
	if (excess > 0) return { retryAfterS: Math.ceil(excess * limit.drainS), bucket };
	return { retryAfterS: 0, bucket: { level: level + 1, updatedAt: now } };
}

/** Takes one try out again: it was the right password, and only wrong ones count. */
export function giveBackTry(bucket: Bucket, limit: Limit, now: Date): Bucket {
	return { level: Math.max(0, levelAt(bucket, limit, now) - 1), updatedAt: now };
}
