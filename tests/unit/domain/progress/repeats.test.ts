import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { GAPS_DAYS, isDue, repeatOf, type ClosedAttempt } from '$lib/server/domain/progress/repeats';

const HOUR_MS = 3_600_000;
const start = new Date('2026-03-02T15:00:00Z').getTime();
/** Attempts at so many days after the first, missed or right. */
const history = (...attempts: [number, 'missed' | 'right'][]): ClosedAttempt[] =>
	attempts.map(([days, what]) => ({
		closedAt: new Date(start + days * 24 * HOUR_MS),
		missed: what === 'missed'
	}));
const dueAfterDays = (...attempts: [number, 'missed' | 'right'][]) => {
	const repeat = repeatOf(history(...attempts));
	return repeat && (repeat.dueAt.getTime() - start) / (24 * HOUR_MS);
};

describe('repeatOf(closed)', () => {
	it('has nothing to repeat where nothing was missed', () => {
		expect(repeatOf([])).toBeNull();
		expect(repeatOf(history([0, 'right'], [3, 'right']))).toBeNull();
	});

	it('brings back what was missed after 1, 3, 7 and 21 days, half a day early, and then lets it go', () => {
		expect(dueAfterDays([0, 'missed'])).toBe(0.5);
		expect(dueAfterDays([0, 'missed'], [1, 'right'])).toBe(3.5);
		expect(dueAfterDays([0, 'missed'], [1, 'right'], [4, 'right'])).toBe(10.5);
		expect(dueAfterDays([0, 'missed'], [1, 'right'], [4, 'right'], [11, 'right'])).toBe(31.5);
		expect(
			repeatOf(history([0, 'missed'], [1, 'right'], [4, 'right'], [11, 'right'], [32, 'right']))
		).toBeNull();
	});

	it('goes one gap back at a miss, and never before the first', () => {
		expect(repeatOf(history([0, 'missed'], [1, 'right'], [4, 'right'], [11, 'missed']))).toMatchObject({
			step: 1
		});
		expect(dueAfterDays([0, 'missed'], [1, 'right'], [4, 'right'], [11, 'missed'])).toBe(13.5);
		expect(repeatOf(history([0, 'missed'], [0.1, 'missed'], [0.2, 'missed']))).toMatchObject({ step: 0 });
	});

	it('is not moved by what is right before its time', () => {
		expect(dueAfterDays([0, 'missed'], [0.1, 'right'], [0.2, 'right'])).toBe(0.5);
	});

	it('is due from its moment on', () => {
		const repeat = repeatOf(history([0, 'missed']));
		if (!repeat) throw new Error('nothing to repeat');
		expect(isDue(repeat, new Date(repeat.dueAt.getTime() - 1))).toBe(false);
		expect(isDue(repeat, repeat.dueAt)).toBe(true);
	});

	it('is always within the gaps, and due after the last attempt that moved it', () => {
		const attempts = fc.array(fc.tuple(fc.integer({ min: 0, max: 100 }), fc.constantFrom('missed', 'right')));
		fc.assert(
			fc.property(attempts, (drawn) => {
				const sorted = drawn.sort(([a], [b]) => a - b) as [number, 'missed' | 'right'][];
				const repeat = repeatOf(history(...sorted));
				const missed = sorted.some(([, what]) => what === 'missed');
				if (!missed) return repeat === null;
				return repeat === null || (repeat.step < GAPS_DAYS.length && repeat.dueAt > repeat.missedAt);
			})
		);
	});
});
