import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findPeaks, highestPoint, lowestPoint, nextPeak } from '$lib/measure/find-peaks';

const levels = [-90, -40, -90, -60, -64, -50, -90, -85, -90, -20];

describe('findPeaks(levelsDbm, {thresholdDbm, excursionDb})', () => {
	it('finds what stands out by 6 dB on both sides, not dents and not the end of the trace', () =>
		expect(findPeaks(levels)).toEqual([1, 5]));
	it('finds smaller ones with a smaller excursion', () =>
		expect(findPeaks(levels, { excursionDb: 3 })).toEqual([1, 3, 5, 7]));
	it('leaves out what lies under the threshold', () =>
		expect(findPeaks(levels, { thresholdDbm: -45 })).toEqual([1]));
	it('finds none on a level trace or a slope', () => {
		expect(findPeaks([-50, -50, -50])).toEqual([]);
		expect(findPeaks([-50, -40, -30], { excursionDb: 0 })).toEqual([]);
	});
	it('finds peaks only at local tops, between which the trace falls by the excursion', () =>
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: -120, max: 20, noNaN: true }), { minLength: 2, maxLength: 60 }),
				fc.double({ min: 0, max: 20, noNaN: true }),
				(trace, excursionDb) => {
					const peaks = findPeaks(trace, { excursionDb });
					for (const [n, index] of peaks.entries()) {
						expect(trace[index]).toBeGreaterThanOrEqual(trace[index - 1]);
						expect(trace[index]).toBeGreaterThanOrEqual(trace[index + 1]);
						if (n === 0) continue;
						const valley = Math.min(...trace.slice(peaks[n - 1], index));
						expect(Math.min(trace[index], trace[peaks[n - 1]]) - valley).toBeGreaterThanOrEqual(excursionDb);
					}
				}
			)
		));
});

describe('nextPeak(levelsDbm, from, side)', () => {
	it('finds the nearest on either side, or none', () => {
		expect(nextPeak(levels, 3, 'lower')).toBe(1);
		expect(nextPeak(levels, 3, 'upper')).toBe(5);
		expect(nextPeak(levels, 5, 'upper')).toBeNull();
	});
});

describe('highestPoint and lowestPoint', () => {
	it('find the first of the extremes', () => {
		expect(highestPoint(levels)).toBe(9);
		expect(lowestPoint(levels)).toBe(0);
	});
});
