/** Bessel functions of the first kind: the line levels of angle modulation. */

/**
 * J₀(x) … J_order(x), by Miller's recurrence downwards, normalised by J₀ + 2·(J₂ + J₄ + …) = 1 (Abramowitz and Stegun 9.1.46).
 * @param x 0 or more
 */
export function besselOrders(order: number, x: number): Float64Array {
	const found = new Float64Array(order + 1);
	if (x < 1e-12) {
		found[0] = 1;
		return found;
	}
	const start = 2 * Math.ceil((Math.max(order, x) + 12 + 4 * Math.cbrt(Math.max(order, x))) / 2);
	let above = 0;
	let here = 1e-30;
	let evens = 0;
	for (let n = start; n >= 0; n--) {
		if (n <= order) found[n] = here;
		if (n % 2 === 0) evens += n === 0 ? here : 2 * here;
		const below = ((2 * n) / x) * here - above;
		above = here;
		here = below;
		if (Math.abs(here) > 1e200) {
			// Scale everything down before it overflows: only ratios matter until the end.
			above *= 1e-200;
			here *= 1e-200;
			evens *= 1e-200;
			for (let k = n; k <= order; k++) found[k] *= 1e-200;
		}
	}
	for (let n = 0; n <= order; n++) found[n] /= evens;
	return found;
}
