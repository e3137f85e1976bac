/** What the resolution filter makes of a burst: a line that is on from one instant to another while the receiver passes it. */
import { faddeeva } from './faddeeva';
import type { Frame } from './frame';
import { addLine, type PassingLine } from './line-response';

/**
 * Adds a burst to array indexes from…to (to excluded).
 * y = a·e^{jψ}[T(t−t₂) − T(t−t₁)] with p = π²/c + jπS, ζ = √p·s + jπδ/√p and
 * T(s) = ½K·e^{−ps²−j2πδs}·w(jζ) for Re ζ ≥ 0, K = (1+jk)^(−1/2): the difference of two complex error functions.
 * Farther than 1.4/B from both edges, where the filter's memory has fallen below 10⁻⁶, the answer is the line's own (inside) or nothing (outside).
 * @param startS, stopS the burst's edges from the sweep's start, s; may be infinite
 */
export function addBurst(
	frame: Frame,
	line: PassingLine,
	startS: number,
	stopS: number,
	from: number,
	to: number,
	re: Float64Array,
	im: Float64Array
): void {
	const { stepS, lead } = frame;
	const edgeS = EDGE_RBW / frame.rbwHz;
	const indexAt = (s: number): number => Math.min(to, Math.max(from, Math.ceil(s / stepS) + lead));
	const parts = Math.ceil(((stopS - startS) * frame.rbwHz) / IMPULSE_LIKE);
	if (parts <= MOST_IMPULSES) {
		const first = indexAt(startS - edgeS);
		const last = indexAt(stopS + edgeS);
		const part = (stopS - startS) / parts;
		for (let i = 0; i < parts; i++)
			addImpulse(frame, line, startS + i * part, startS + (i + 1) * part, first, last, re, im);
		return;
	}
	if (stopS - startS <= 2 * edgeS) {
		addEdges(frame, line, startS, stopS, indexAt(startS - edgeS), indexAt(stopS + edgeS), re, im);
		return;
	}
	const a = indexAt(startS - edgeS);
	const b = indexAt(startS + edgeS);
	const c = indexAt(stopS - edgeS);
	const d = indexAt(stopS + edgeS);
	addEdges(frame, line, startS, Infinity, a, b, re, im);
	addLine(frame, line, b, c, re, im);
	addEdges(frame, line, -Infinity, stopS, c, d, re, im);
}

/** Time either side of an edge within which the filter answers to it, in 1/B. */
export const EDGE_RBW = 1.4;
/** A burst shorter than this (in 1/B) meets the filter as an impulse: the answer's own shape, to 2·10⁻³ of its peak; a few of them make a longer one. */
const IMPULSE_LIKE = 0.05;
const MOST_IMPULSES = 4;

/** y = a·e^{jψ(m)}·τ·sinc(δτ)·h(t − m), with m the burst's middle, τ its length and h = √(π/c)·exp(−π²t²/c). */
function addImpulse(
	frame: Frame,
	line: PassingLine,
	startS: number,
	stopS: number,
	from: number,
	to: number,
	re: Float64Array,
	im: Float64Array
): void {
	const { c, stepS, lead } = frame;
	const length = stopS - startS;
	const middle = (startS + stopS) / 2;
	const rate = line.passingHzPerS;
	const turn = Math.PI * (line.offsetHz - rate * middle) * length;
	const size = length * Math.sqrt(Math.PI / c) * (turn === 0 ? 1 : Math.sin(turn) / turn);
	const psi = 2 * Math.PI * ((line.offsetHz * middle) % 1) - Math.PI * rate * middle * middle;
	const x = size * (line.re * Math.cos(psi) - line.im * Math.sin(psi));
	const y = size * (line.re * Math.sin(psi) + line.im * Math.cos(psi));
	const decay = (Math.PI * Math.PI) / c;
	for (let i = from; i < to; i++) {
		const t = (i - lead) * stepS - middle;
		const g = Math.exp(-decay * t * t);
		re[i] += x * g;
		im[i] += y * g;
	}
}

const w = new Float64Array(2);

function addEdges(
	frame: Frame,
	line: PassingLine,
	startS: number,
	stopS: number,
	from: number,
	to: number,
	re: Float64Array,
	im: Float64Array
): void {
	const { c, stepS, lead } = frame;
	const rate = line.passingHzPerS;
	const k = (c * rate) / Math.PI;
	const px = (Math.PI * Math.PI) / c;
	const py = Math.PI * rate;
	// √p and its inverse, by polar form
	const rootSize = Math.sqrt(Math.hypot(px, py));
	const rootTurn = 0.5 * Math.atan2(py, px);
	const sx = rootSize * Math.cos(rootTurn);
	const sy = rootSize * Math.sin(rootTurn);
	const ix = sx / (rootSize * rootSize);
	const iy = -sy / (rootSize * rootSize);
	const half = 0.5 * (1 + k * k) ** -0.25;
	const turn = -0.5 * Math.atan(k);
	for (let i = from; i < to; i++) {
		const t = (i - lead) * stepS;
		const delta = line.offsetHz - rate * t;
		let x = 0;
		let y = 0;
		let full = 0;
		// erf(ζ₁) − erf(ζ₂) = erfc(ζ₂) − erfc(ζ₁), and erfc(ζ) = 2 − erfc(−ζ) where Re ζ < 0: whole terms cancel by sign first.
		for (let edge = 0; edge < 2; edge++) {
			const sign = edge === 0 ? -1 : 1;
			const s = t - (edge === 0 ? startS : stopS);
			if (s === Infinity) continue;
			if (s === -Infinity) {
				full += sign;
				continue;
			}
			// ζ = √p·s + jπδ/√p
			let zx = sx * s - Math.PI * delta * iy;
			let zy = sy * s + Math.PI * delta * ix;
			let part = sign;
			if (zx < 0) {
				zx = -zx;
				zy = -zy;
				full += sign;
				part = -sign;
			}
			faddeeva(-zy, zx, w); // w(jζ)
			const size = part * Math.exp(-px * s * s);
			const angle = -py * s * s - 2 * Math.PI * delta * s;
			const ex = size * Math.cos(angle);
			const ey = size * Math.sin(angle);
			x += ex * w[0] - ey * w[1];
			y += ex * w[1] + ey * w[0];
		}
		if (full !== 0) {
			// the whole line: 2·exp(−π²δ²/p) in units where erfc is what is summed
			const decay = (c * delta * delta) / (1 + k * k);
			const size = 2 * full * Math.exp(-decay);
			x += size * Math.cos(k * decay);
			y += size * Math.sin(k * decay);
		}
		const psi = 2 * Math.PI * ((line.offsetHz * t) % 1) - Math.PI * rate * t * t + turn;
		const cos = half * Math.cos(psi);
		const sin = half * Math.sin(psi);
		const ax = line.re * cos - line.im * sin;
		const ay = line.re * sin + line.im * cos;
		re[i] += ax * x - ay * y;
		im[i] += ax * y + ay * x;
	}
}
