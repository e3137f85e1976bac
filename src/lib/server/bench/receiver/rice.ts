/** The Rice law: power of a steady line of power s in Gaussian noise of mean power 1. */

/** e^{−x}·I₀(x), x ≥ 0 (Abramowitz & Stegun 9.8.1, 9.8.2: relative error below 2·10⁻⁷). */
export function besselI0Scaled(x: number): number {
	if (x < 3.75) {
		const t = (x / 3.75) ** 2;
		const i0 =
			1 +
			t * (3.5156229 + t * (3.0899424 + t * (1.2067492 + t * (0.2659732 + t * (0.0360768 + t * 0.0045813)))));
		return i0 * Math.exp(-x);
	}
	const t = 3.75 / x;
	const p =
		0.39894228 +
		t *
			(0.01328592 +
				t *
					(0.00225319 +
						t *
							(-0.00157565 +
								t *
									(0.00916281 + t * (-0.02057706 + t * (0.02635537 + t * (-0.01647633 + t * 0.00392377)))))));
	return p / Math.sqrt(x);
}

/** e^{−x}·I₁(x), x ≥ 0 (Abramowitz & Stegun 9.8.3, 9.8.4). */
export function besselI1Scaled(x: number): number {
	if (x < 3.75) {
		const t = (x / 3.75) ** 2;
		const i1 =
			x *
			(0.5 +
				t *
					(0.87890594 +
						t * (0.51498869 + t * (0.15084934 + t * (0.02658733 + t * (0.00301532 + t * 0.00032411))))));
		return i1 * Math.exp(-x);
	}
	const t = 3.75 / x;
	const p =
		0.39894228 +
		t *
			(-0.03988024 +
				t *
					(-0.00362018 +
						t *
							(0.00163801 +
								t *
									(-0.01031555 +
										t * (0.02282967 + t * (-0.02895312 + t * (0.01787654 + t * -0.00420059)))))));
	return p / Math.sqrt(x);
}

/**
 * P(power < x): the noncentral chi-square law of two degrees of freedom as a Poisson mixture of gammas;
 * for s above 20 the amplitude is normal to better than 3·10⁻³.
 */
export function riceCdf(x: number, s: number): number {
	if (x <= 0) return 0;
	if (s > 20) return normalCdf((Math.sqrt(x) - Math.sqrt(s) - 1 / (4 * Math.sqrt(s))) * Math.SQRT2);
	// terms e^{−s}s^j/j! · P(j+1, x), P(j+1, x) = 1 − e^{−x}Σ_{i≤j} x^i/i!
	let poisson = Math.exp(-s);
	let term = Math.exp(-x);
	let tail = term;
	let sum = poisson * (1 - tail);
	let weight = poisson;
	for (let j = 1; j < 120; j++) {
		poisson *= s / j;
		term *= x / j;
		tail += term;
		sum += poisson * Math.max(0, 1 - tail);
		weight += poisson;
		if (j > s && 1 - weight < 1e-12) break;
	}
	return Math.min(1, sum);
}

/** The normal law, by the complementary error function (Numerical Recipes' Chebyshev fit, relative error 1.2·10⁻⁷; from memory). */
function normalCdf(z: number): number {
	const x = Math.abs(z) / Math.SQRT2;
	const t = 1 / (1 + 0.5 * x);
	const poly =
		-1.26551223 +
		t *
			(1.00002368 +
				t *
					(0.37409196 +
						t *
							(0.09678418 +
								t *
									(-0.18628806 +
										t *
											(0.27886807 +
												t * (-1.13520398 + t * (1.48851587 + t * (-0.82215223 + t * 0.17087277))))))));
	const erfc = t * Math.exp(-x * x + poly);
	return z >= 0 ? 1 - erfc / 2 : erfc / 2;
}

/** Exponential integral E₁(x), x > 0 (Abramowitz & Stegun 5.1.53, 5.1.56). */
export function expIntegral(x: number): number {
	if (x <= 1)
		return (
			-Math.log(x) -
			0.57721566 +
			x * (0.99999193 + x * (-0.24991055 + x * (0.05519968 + x * (-0.00976004 + x * 0.00107857))))
		);
	const top = 0.2677737343 + x * (8.6347608925 + x * (18.059016973 + x * (8.5733287401 + x)));
	const bottom = 3.9584969228 + x * (21.0996530827 + x * (25.6329561486 + x * (9.5733223454 + x)));
	return (Math.exp(-x) / x) * (top / bottom);
}
