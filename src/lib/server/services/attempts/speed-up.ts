/** No sweep is waited for longer than this, s of real time. */
const LONGEST_REAL_SWEEP_S = 8;
const FACTORS = [1, 2, 5, 10, 20, 50, 100, 200, 500];

/**
 * Bench seconds per real second for sweeps of `sweepTimeS`: 1 up to 8 s, then the next round factor that keeps under 8 s.
 * @param sweepTimeS at most 2000 s, which takes 500
 */
export const speedUpOf = (sweepTimeS: number): number =>
	FACTORS.find((factor) => sweepTimeS / factor <= LONGEST_REAL_SWEEP_S) ?? FACTORS[FACTORS.length - 1];
