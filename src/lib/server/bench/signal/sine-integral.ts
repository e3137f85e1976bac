/** Below this the power series is used, above it the continued fraction. */
const SERIES_LIMIT = 2;

/** Si(x) = ∫₀ˣ sin t / t dt, odd in x; Si(∞) = π/2 (Abramowitz & Stegun 5.2.1). To about 1e-15. */
export function sineIntegral(x: number): number {
	const t = Math.abs(x);
	if (t <= SERIES_LIMIT) {
		let term = t;
		let sum = t;
		for (let k = 3; Math.abs(term) > 1e-18 && k < 60; k += 2) {
			term *= (-t * t) / ((k - 1) * k);
			sum += term / k;
		}
		return Math.sign(x) * sum;
	}
	return Math.sign(x) * (Math.PI / 2 + exponentialTail(t).im);
}

/** Cin(x) = ∫₀ˣ (1 − cos t) / t dt = γ + ln x − Ci(x), even in x (A&S 5.2.2). To about 1e-15. */
export function cosineIntegralEntire(x: number): number {
	const t = Math.abs(x);
	if (t <= SERIES_LIMIT) {
		let term = -1;
		let sum = 0;
		for (let k = 2; Math.abs(term) > 1e-18 && k < 60; k += 2) {
			term *= (-t * t) / ((k - 1) * k);
			sum += term / k;
		}
		return sum;
	}
	return 0.5772156649015329 + Math.log(t) + exponentialTail(t).re;
}

/** E1(jt) by its continued fraction (A&S 5.1.22, Lentz): −Ci(t) + j(Si(t) − π/2), for t > 2. */
function exponentialTail(t: number): { re: number; im: number } {
	let bRe = 1;
	let denominator = 1 / (1 + t * t);
	let dRe = denominator;
	let dIm = -t * denominator;
	let hRe = dRe;
	let hIm = dIm;
	let cRe = 1e300;
	let cIm = 0;
	for (let i = 1; i < 200; i++) {
		const a = -i * i;
		bRe += 2;
		const inverseRe = a * dRe + bRe;
		const inverseIm = a * dIm + t;
		denominator = 1 / (inverseRe * inverseRe + inverseIm * inverseIm);
		dRe = inverseRe * denominator;
		dIm = -inverseIm * denominator;
		const size = cRe * cRe + cIm * cIm;
		const nextRe = bRe + (size < 1e299 ? (a * cRe) / size : 0);
		cIm = t - (size < 1e299 ? (a * cIm) / size : 0);
		cRe = nextRe;
		const stepRe = cRe * dRe - cIm * dIm;
		const stepIm = cRe * dIm + cIm * dRe;
		const re = hRe * stepRe - hIm * stepIm;
		hIm = hRe * stepIm + hIm * stepRe;
		hRe = re;
		if (Math.abs(stepRe - 1) + Math.abs(stepIm) < 1e-16) break;
	}
	const cos = Math.cos(t);
	const sin = Math.sin(t);
	return { re: cos * hRe + sin * hIm, im: cos * hIm - sin * hRe };
}
