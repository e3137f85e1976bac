/** The Gaussian resolution filter: |H(f)| = exp(−c·f²), 3 dB width B, c = 2·ln 2 / B² (bench.md's contract; H is real and zero-phase). */

/** The exponent's constant c, s², for a 3 dB width in Hz: amplitude exp(−c·offset²). */
export const gaussianConstant = (rbwHz: number): number => (2 * Math.LN2) / (rbwHz * rbwHz);

/** Impulse bandwidth over B: √(π/(2 ln 2)). Also independent power values per unit of B·t. */
export const IMPULSE_PER_RBW = Math.sqrt(Math.PI / (2 * Math.LN2));

/**
 * Chirp factor k = c·S/π of a Gaussian filter swept at S Hz/s: a line's amplitude falls by (1+k²)^(−1/4),
 * its displayed width grows by √(1+k²). (Gaussian integral; W. W. Peterson, Univ. of Michigan TR 38, 1955.)
 */
export const chirpFactor = (rbwHz: number, sweepHzPerS: number): number =>
	(gaussianConstant(rbwHz) * sweepHzPerS) / Math.PI;
