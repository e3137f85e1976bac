import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { giveBackTry, takeTry, type Bucket, type Limit } from '$lib/server/domain/sign-in-limit';

const limit: Limit = { capacity: 3, drainS: 30 };
const at = (s: number) => new Date(Date.UTC(2026, 0, 1) + s * 1000);
const empty: Bucket = { level: 0, updatedAt: at(0) };

/** Tries at these seconds, in order; for each, the seconds to wait. */
function tries(secondsS: number[]): number[] {
	let bucket = empty;
	return secondsS.map((s) => {
		const taken = takeTry(bucket, limit, at(s));
		bucket = taken.bucket;
		return taken.retryAfterS;
	});
}

describe('takeTry(bucket, limit, now)', () => {
	it('lets as many through at once as the bucket holds', () => {
		expect(tries([0, 0, 0, 0])).toEqual([0, 0, 0, 30]);
	});

	it('lets one more through each time one has drained', () => {
		expect(tries([0, 0, 0, 29, 30, 30, 60])).toEqual([0, 0, 0, 1, 0, 30, 0]);
	});

	it('never makes anybody wait longer than one try takes to drain, however many are refused', () => {
		fc.assert(
			fc.property(fc.array(fc.double({ min: 0, max: 20, noNaN: true }), { maxLength: 200 }), (gapsS) => {
				let s = 0;
				const waits = tries(gapsS.map((gap) => (s += gap)));
				expect(Math.max(0, ...waits)).toBeLessThanOrEqual(limit.drainS);
			})
		);
	});

	it('is open again after the wait it names', () => {
		const full = [0, 0, 0].reduce((bucket) => takeTry(bucket, limit, at(0)).bucket, empty);
		const { retryAfterS } = takeTry(full, limit, at(7));
		expect(retryAfterS).toBe(23);
		expect(takeTry(full, limit, at(7 + retryAfterS)).retryAfterS).toBe(0);
	});
});

describe('giveBackTry(bucket, limit, now)', () => {
	it('undoes one try and never goes below empty', () => {
		const one = takeTry(empty, limit, at(0)).bucket;
		expect(giveBackTry(one, limit, at(0)).level).toBe(0);
		expect(giveBackTry(empty, limit, at(100)).level).toBe(0);
	});
});
