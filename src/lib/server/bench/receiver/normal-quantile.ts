/**
 * The standard normal's quantile for 0 < p < 1, by P. J. Acklam's rational approximation (relative error below 1.2·10⁻⁹; from memory,
 * checked in the tests against the normal law's known points).
 */
export function normalQuantile(p: number): number {
	const low = 0.02425;
	if (p < low) return tail(Math.sqrt(-2 * Math.log(p)));
	if (p > 1 - low) return -tail(Math.sqrt(-2 * Math.log1p(-p)));
	const q = p - 0.5;
	const r = q * q;
	const top =
		((((-39.69683028665376 * r + 220.9460984245205) * r - 275.9285104469687) * r + 138.357751867269) * r -
			30.66479806614716) *
			r +
		2.506628277459239;
	const bottom =
		((((-54.47609879822406 * r + 161.5858368580409) * r - 155.6989798598866) * r + 66.80131188771972) * r -
			13.28068155288572) *
			r +
		1;
	return (top * q) / bottom;
}

function tail(q: number): number {
	const top =
		((((-0.007784894002430293 * q - 0.3223964580411365) * q - 2.400758277161838) * q - 2.549732539343734) *
			q +
			4.374664141464968) *
			q +
		2.938163982698783;
	const bottom =
		(((0.007784695709041462 * q + 0.3224671290700398) * q + 2.445134137142996) * q + 3.754408661907416) * q +
		1;
	return top / bottom;
}
