/**
 * Sums of sinc²(x − k) over a run of whole numbers k, sinc x = sin(πx)/(πx), and their integrals: the spectrum of
 * evenly spaced carriers with rectangular pulses. Nearby terms one by one, the far ones together by Euler-Maclaurin,
 * since sin²(π(x − k)) is the same for all: a thousand carriers cost no more than twenty. To about 1e-11.
 */
import { sineIntegral } from './sine-integral';

/** Distance beyond which asymptotic series serve. */
const FAR = 8;

/** Σ sinc²(x − k), k = first … last. */
export function sincSquaredSum(first: number, last: number, x: number): number {
	return sumBySide(first, last, x, densityFrom, densityFrom);
}

/** ∫ of `sincSquaredSum` from −∞ to x: 0 to last − first + 1. */
export function sincSquaredSumBelow(first: number, last: number, x: number): number {
	return sumBySide(first, last, x, (u, count) => count - tailFrom(u, count), tailFrom);
}

/** Adds the terms at distances u, u+1, … (count of them) left of x and right of x; u ≥ 0. */
function sumBySide(
	first: number,
	last: number,
	x: number,
	left: (u: number, count: number) => number,
	right: (u: number, count: number) => number
): number {
	const nearestBelow = Math.min(last, Math.floor(x));
	const nearestAbove = Math.max(first, Math.floor(x) + 1);
	const below = Math.max(0, nearestBelow - first + 1);
	const above = Math.max(0, last - nearestAbove + 1);
	return (below ? left(x - nearestBelow, below) : 0) + (above ? right(nearestAbove - x, above) : 0);
}

/** Σ sinc² at u, u+1, …, u+count−1. */
function densityFrom(u: number, count: number): number {
	const near = Math.min(count, Math.max(0, Math.ceil(FAR - u)));
	let sum = 0;
	for (let n = 0; n < near; n++) sum += sincSquared(u + n);
	const sine = Math.sin(Math.PI * (u % 1));
	return sum + ((sine * sine) / Math.PI ** 2) * inversePowers(2, u + near, count - near);
}

const sincSquared = (u: number): number => {
	const x = Math.PI * u;
	return x < 1e-8 ? 1 : (Math.sin(x) / x) ** 2;
};

/** Σ ∫ sinc² from u + n to ∞, n = 0 … count−1. */
function tailFrom(u: number, count: number): number {
	const near = Math.min(count, Math.max(0, Math.ceil(FAR - u)));
	let sum = 0;
	for (let n = 0; n < near; n++) sum += tail(u + n);
	if (count === near) return sum;
	// π·tail = π/2 − Si(z) + (1 − cos z)/z, z = 2πu, with Si's series for large z (Abramowitz & Stegun 5.2.8, 5.2.38-39).
	const z = 2 * Math.PI * (u % 1);
	const over = (power: number) => inversePowers(power, u + near, count - near) / (2 * Math.PI) ** power;
	const even = over(2) - 6 * over(4) + 120 * over(6) - 5040 * over(8);
	const odd = -2 * over(3) + 24 * over(5) - 720 * over(7) + 40320 * over(9);
	return sum + (over(1) + Math.sin(z) * even + Math.cos(z) * odd) / Math.PI;
}

const tail = (u: number): number => {
	const z = 2 * Math.PI * u;
	const rest = z < 1e-8 ? 0 : (1 - Math.cos(z)) / z;
	return (Math.PI / 2 - sineIntegral(z) + rest) / Math.PI;
};

/** Σ (u + n)^−power, n = 0 … count−1, u ≥ 8. */
function inversePowers(power: number, u: number, count: number): number {
	return count > 0 ? remainder(power, u) - remainder(power, u + count) : 0;
}

/** Σ (u + n)^−p to infinity by Euler-Maclaurin; for p = 1 less a constant that a difference doesn't see. */
function remainder(p: number, u: number): number {
	const whole = p === 1 ? -Math.log(u) : u ** (1 - p) / (p - 1);
	const square = u * u;
	const third = (p * (p + 1) * (p + 2)) / (720 * square);
	const fifth = (p * (p + 1) * (p + 2) * (p + 3) * (p + 4)) / (30240 * square * square);
	return whole + u ** -p * (0.5 + (p / 12 - third + fifth) / u);
}
