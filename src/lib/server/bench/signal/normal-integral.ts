/** From here up, what is left above is lost in the last digit of 1. */
const ALL_BELOW = 9;

/**
 * Φ(x): share of a standard normal below x, 0 to 1, to about 1e-15.
 * Series near the middle, continued fraction in the tails (Abramowitz & Stegun 26.2.10, 26.2.14).
 */
export function normalIntegral(x: number): number {
	const t = Math.abs(x);
	if (x > ALL_BELOW) return 1;
	const density = Math.exp((-t * t) / 2) / Math.sqrt(2 * Math.PI);
	if (t < 3) {
		let term = t;
		let sum = t;
		for (let k = 3; term > 1e-18 && k < 200; k += 2) {
			term *= (t * t) / k;
			sum += term;
		}
		return x >= 0 ? 0.5 + density * sum : 0.5 - density * sum;
	}
	let fraction = t;
	for (let k = 60; k > 0; k--) fraction = t + k / fraction;
	return x >= 0 ? 1 - density / fraction : density / fraction;
}
