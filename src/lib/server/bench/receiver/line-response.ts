/** What a spectral line does on the screen: the closed-form answer of a Gaussian filter to a line passed at constant rate. */
import type { Frame } from './frame';

/** A line as a sweep meets it: complex amplitude at the sweep's start, offset from the tuned start, and its own rate. */
export interface PassingLine {
	re: number;
	im: number;
	/** Line frequency minus tuned frequency at n = 0, Hz. */
	offsetHz: number;
	/** Rate at which the receiver passes it: S minus the line's drift, Hz/s. */
	passingHzPerS: number;
}

const RESTART = 2048;

/** Tuned distance at which the line's power falls to `ratio` of its full level, Hz. */
export function lineReachHz(c: number, chirp: number, ratio: number): number {
	return Math.sqrt(((1 + chirp * chirp) / (2 * c)) * Math.log(1 / ratio));
}

/**
 * Adds a·(1+jk)^(−1/2)·exp(−cδ²/(1+jk))·e^{jψ} for array indexes from…to (to excluded).
 * The exponent is quadratic in n, so each further sample costs two complex multiplications;
 * it is restarted every 2048 samples, and runs outward from the peak so that it never starts from an underflow.
 */
export function addLine(
	frame: Frame,
	line: PassingLine,
	from: number,
	to: number,
	re: Float64Array,
	im: Float64Array
): void {
	const peak =
		line.passingHzPerS === 0
			? from
			: frame.lead + Math.round(line.offsetHz / line.passingHzPerS / frame.stepS);
	const middle = Math.min(Math.max(peak, from), to);
	for (let start = middle; start < to; start += RESTART)
		run(frame, line, start, Math.min(start + RESTART, to), 1, re, im);
	for (let start = middle - 1; start >= from; start -= RESTART)
		run(frame, line, start, Math.max(start - RESTART, from - 1), -1, re, im);
}

function run(
	frame: Frame,
	line: PassingLine,
	from: number,
	to: number,
	direction: 1 | -1,
	re: Float64Array,
	im: Float64Array
): void {
	const { c, stepS, lead } = frame;
	const rate = line.passingHzPerS;
	const k = (c * rate) / Math.PI;
	const q = 1 + k * k;
	// exponent E(t) = −c·δ²/(1+jk) + jψ with δ = d0 − rate·t, ψ = 2π(d0·t − rate·t²/2)
	const t = (from - lead) * stepS;
	const h = direction * stepS;
	const delta = line.offsetHz - rate * t;
	const decay = (c * delta * delta) / q;
	const psi = 2 * Math.PI * ((line.offsetHz * t) % 1) - Math.PI * rate * t * t;
	// amplitude factor (1+jk)^(−1/2)
	const scale = q ** -0.25;
	const turn = -0.5 * Math.atan(k);
	const size = scale * Math.exp(-decay);
	const angle = psi + k * decay + turn;
	const cos = Math.cos(angle);
	const sin = Math.sin(angle);
	let x = size * (line.re * cos - line.im * sin);
	let y = size * (line.re * sin + line.im * cos);
	// first difference E(t+h) − E(t): −c/(1+jk)·(−2δ·rate·h + rate²h²) + j2π(δ·h − rate·h²/2)
	const first = (c * (2 * delta * rate * h - rate * rate * h * h)) / q;
	const step = Math.exp(first);
	const turnStep = -k * first + 2 * Math.PI * (delta * h - 0.5 * rate * h * h);
	let sx = step * Math.cos(turnStep);
	let sy = step * Math.sin(turnStep);
	// second difference: −2c·rate²h²/(1+jk) − j2π·rate·h²
	const second = (-2 * c * rate * rate * h * h) / q;
	const bend = Math.exp(second);
	const bendTurn = -k * second - 2 * Math.PI * rate * h * h;
	const bx = bend * Math.cos(bendTurn);
	const by = bend * Math.sin(bendTurn);
	for (let i = from; i !== to; i += direction) {
		re[i] += x;
		im[i] += y;
		const nx = x * sx - y * sy;
		y = x * sy + y * sx;
		x = nx;
		const nsx = sx * bx - sy * by;
		sy = sx * by + sy * bx;
		sx = nsx;
	}
}

/** The same answer at one instant t (s from the sweep's start), added to out[0], out[1]. */
export function addLineAt(frame: Frame, line: PassingLine, t: number, out: Float64Array): void {
	const rate = line.passingHzPerS;
	const k = (frame.c * rate) / Math.PI;
	const q = 1 + k * k;
	const delta = line.offsetHz - rate * t;
	const decay = (frame.c * delta * delta) / q;
	const size = q ** -0.25 * Math.exp(-decay);
	const angle =
		2 * Math.PI * ((line.offsetHz * t) % 1) - Math.PI * rate * t * t + k * decay - 0.5 * Math.atan(k);
	const cos = size * Math.cos(angle);
	const sin = size * Math.sin(angle);
	out[0] += line.re * cos - line.im * sin;
	out[1] += line.re * sin + line.im * cos;
}
