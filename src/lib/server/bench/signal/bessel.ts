/**
 * Bessel functions of the first kind J_0(x) … J_N(x), for x ≥ 0, by Miller's backward recurrence
 * J_{n−1} = (2n/x)·J_n − J_{n+1} (Abramowitz & Stegun 9.12, example 1).
 * Scaled by J_0² + 2ΣJ_n² = 1 (A&S 9.1.76), whose terms are all positive, so that nothing cancels at large x.
 * @returns N + 1 values, index = order
 */
export function besselJ(highestOrder: number, x: number): Float64Array {
	if (!(x >= 0)) throw new RangeError(`x must be >= 0, got ${x}`);
	const values = new Float64Array(highestOrder + 1);
	// First terms of the series (A&S 9.1.10): the recurrence would overflow, and the rest is under 1e-25.
	if (x < 1e-8) {
		[1, x / 2, (x * x) / 8].forEach((value, n) => {
			if (n <= highestOrder) values[n] = value;
		});
		return values;
	}
	const start = 2 * Math.ceil((Math.max(highestOrder, x) + 16 * Math.cbrt(x) + 24) / 2);
	let above = 0;
	let here = 1e-100;
	let squares = 2 * here * here;
	let evenSum = 2 * here;
	if (start <= highestOrder) values[start] = here;
	for (let n = start; n > 0; n--) {
		const below = ((2 * n) / x) * here - above;
		above = here;
		here = below;
		if (n - 1 <= highestOrder) values[n - 1] = here;
		const weight = n === 1 ? 1 : 2;
		squares += weight * here * here;
		if (n % 2 === 1) evenSum += weight * here;
		if (Math.abs(here) > 1e120) {
			above *= 1e-120;
			here *= 1e-120;
			squares *= 1e-240;
			evenSum *= 1e-120;
			for (let m = n - 1; m <= highestOrder; m++) values[m] *= 1e-120;
		}
	}
	// J_0 + 2(J_2 + J_4 + …) = 1 (A&S 9.1.46) settles the sign that the squares can't.
	const scale = Math.sign(evenSum) / Math.sqrt(squares);
	for (let n = 0; n <= highestOrder; n++) values[n] *= scale;
	return values;
}
