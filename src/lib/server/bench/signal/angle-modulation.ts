/** What FM and PM by one tone have in common. */
import { besselJ } from './bessel';
import { NEGLIGIBLE } from './comb';
import type { Band, Behaviour, Line } from './emitter-kind';

/** More lines than this inside the filter, and the signal is a line whose frequency moves slowly. */
const LINES_TO_RESOLVE = 200;
/**
 * A spectrum of more lines than this is followed as a moving line as soon as the filter's memory holds less than a twentieth
 * of the tone's period: its momentary frequency and rate then say all (and thousands of lines would keep a learner waiting).
 */
const MOST_LINES = 600;
const SLOW_TONE = 1 / 20;

export interface AngleModulation {
	frequencyHz: number;
	powerMw: number;
	modulatingHz: number;
	/** Peak phase deviation β, rad. */
	indexRad: number;
	carrierRad: number;
	/** Phase of the tone in β·sin(2π·modulatingHz·t + toneRad). */
	toneRad: number;
}

/** J_0 … J_N of the phase deviation, N the order of the last line that holds 1e-12 of the power or more. */
function ordersOf(indexRad: number): Float64Array {
	const values = besselJ(Math.ceil(indexRad + 12 * Math.cbrt(indexRad) + 8), indexRad);
	let last = values.length - 1;
	while (values[last] * values[last] < NEGLIGIBLE) last--;
	return values.subarray(0, last + 1);
}

/**
 * Lines of exp(j·β·sin θ) = Σ J_n(β)·e^{jnθ} (Jacobi-Anger), J_{−n} = (−1)ⁿ·J_n, that hold more than 1e-12 of the power.
 * J_n(β) at n modulating frequencies from the carrier.
 */
export function angleLines(signal: AngleModulation, band?: Band): Line[] {
	const j = ordersOf(signal.indexRad);
	const outermost = j.length - 1;
	const root = Math.sqrt(signal.powerMw);
	const lines: Line[] = [];
	for (let n = -outermost; n <= outermost; n++) {
		const order = Math.abs(n);
		const frequencyHz = signal.frequencyHz + n * signal.modulatingHz;
		if (band && (frequencyHz < band.startHz || frequencyHz > band.stopHz)) continue;
		if (j[order] * j[order] < NEGLIGIBLE) continue;
		const amplitude = root * (n < 0 && order % 2 === 1 ? -j[order] : j[order]);
		const phaseRad = signal.carrierRad + n * signal.toneRad;
		lines.push({ frequencyHz, re: amplitude * Math.cos(phaseRad), im: amplitude * Math.sin(phaseRad) });
	}
	return lines;
}

/** Lines, or quasi-static once more than 200 of them lie inside `rbwHz`, or very many about a filter much wider than the tone. */
export function angleBehaviour(modulatingHz: number, indexRad: number, rbwHz: number): Behaviour {
	const lines = 2 * ordersOf(indexRad).length - 1;
	const inside = Math.min(lines, Math.floor(rbwHz / modulatingHz) + 1);
	if (inside > LINES_TO_RESOLVE) return 'quasi-static';
	return lines > MOST_LINES && modulatingHz <= SLOW_TONE * rbwHz ? 'quasi-static' : 'lines';
}
