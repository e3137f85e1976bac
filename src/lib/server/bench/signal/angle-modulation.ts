/** What FM and PM by one tone have in common. */
import { besselJ } from './bessel';
import { NEGLIGIBLE } from './comb';
import type { Band, Behaviour, Line } from './emitter-kind';

/** More lines than this inside the filter, and the signal is a line whose frequency moves slowly. */
const LINES_TO_RESOLVE = 200;

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

/** Order of the last line of phase deviation `indexRad` that may hold more than 1e-12 of the power. */
const outermostOrder = (indexRad: number): number => Math.ceil(indexRad + 12 * Math.cbrt(indexRad) + 8);

/**
 * Lines of exp(j·β·sin θ) = Σ J_n(β)·e^{jnθ} (Jacobi-Anger), J_{−n} = (−1)ⁿ·J_n, that hold more than 1e-12 of the power.
 * J_n(β) at n modulating frequencies from the carrier.
 */
export function angleLines(signal: AngleModulation, band?: Band): Line[] {
	const outermost = outermostOrder(signal.indexRad);
	const j = besselJ(outermost, signal.indexRad);
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

/** Lines, or quasi-static once more than 200 of them lie inside `rbwHz`. */
export function angleBehaviour(modulatingHz: number, indexRad: number, rbwHz: number): Behaviour {
	const inside = Math.min(2 * outermostOrder(indexRad) + 1, Math.floor(rbwHz / modulatingHz) + 1);
	return inside > LINES_TO_RESOLVE ? 'quasi-static' : 'lines';
}
