/** The Gaussian resolution filter as a reading needs it: power falls by half at ±B/2 and by 2^(−(2f/B)²) at f. */

/** Noise bandwidth over B: √(π/(4·ln 2)) = 1.064467. */
export const NOISE_PER_RBW = Math.sqrt(Math.PI / (4 * Math.LN2));
/** dB that a line loses one B from the centre: 40·log10 2. */
const LOSS_AT_RBW_DB = 40 * Math.log10(2);

/** Width of the rectangular filter that lets through as much noise, Hz. */
export const noiseBandwidthHz = (rbwHz: number): number => NOISE_PER_RBW * rbwHz;

/** What a line loses `offsetHz` from the centre of the filter, dB; 3.0103 at half of `rbwHz`. */
export const filterLossDb = (offsetHz: number, rbwHz: number): number =>
	LOSS_AT_RBW_DB * (offsetHz / rbwHz) ** 2;

/** The filter's own width `downDb` below its top, Hz; `rbwHz` at 3.0103 dB. */
export const filterWidthHz = (downDb: number, rbwHz: number): number =>
	2 * rbwHz * Math.sqrt(downDb / LOSS_AT_RBW_DB);

/** The fastest sweep that the two filters follow: 5·span/(RBW·min(RBW, VBW)), at least 1 ms. */
export const unhurriedSweepTimeS = (spanHz: number, rbwHz: number, vbwHz: number): number =>
	Math.max(1e-3, (5 * spanHz) / (rbwHz * Math.min(rbwHz, vbwHz)));

/** What a line loses when the sweep runs at `sweepHzPerS`: 5·log10(1 + q²), q = (2·ln 2/π)·S/B² (W. W. Peterson 1955). */
export const sweepLossDb = (sweepHzPerS: number, rbwHz: number): number =>
	5 * Math.log10(1 + (((2 * Math.LN2) / Math.PI) * (sweepHzPerS / rbwHz ** 2)) ** 2);
