/** Lines of what repeats: a line switched on and off, a line modulated by a tone. */
import type { Band, Line } from './emitter-kind';

/** Lines weaker than this share of the whole are left out. */
export const NEGLIGIBLE = 1e-12;
const NULLS_WITHOUT_BAND = 20;

/**
 * The lines of `line` let through for `onS` out of every `periodS`, the first time at `startS`: Fourier series of a
 * rectangle, amplitude d·sinc(n·d) at n/periodS from the line, d = onS/periodS.
 * Without `band`, only what lies within twenty nulls.
 */
export function combOfSwitchedLine(
	line: Line,
	train: { onS: number; periodS: number; startS: number },
	band?: Band
): Line[] {
	const duty = train.onS / train.periodS;
	const spacingHz = 1 / train.periodS;
	// Power of line n is at most 1/(πn)² of the peak; the whole is the duty's share of it.
	const negligible = 1 / (Math.PI * Math.sqrt(NEGLIGIBLE * duty));
	const reach = Math.floor(band ? negligible : Math.min(negligible, NULLS_WITHOUT_BAND / duty));
	const first = band ? Math.max(-reach, Math.ceil((band.startHz - line.frequencyHz) / spacingHz)) : -reach;
	const last = band ? Math.min(reach, Math.floor((band.stopHz - line.frequencyHz) / spacingHz)) : reach;
	const middleS = train.startS + train.onS / 2;
	const lines: Line[] = [];
	for (let n = first; n <= last; n++) {
		const x = Math.PI * n * duty;
		const amplitude = n === 0 ? duty : (duty * Math.sin(x)) / x;
		if (amplitude * amplitude < NEGLIGIBLE * duty) continue;
		const turn = -2 * Math.PI * n * spacingHz * middleS;
		const re = amplitude * Math.cos(turn);
		const im = amplitude * Math.sin(turn);
		lines.push({
			frequencyHz: line.frequencyHz + n * spacingHz,
			re: line.re * re - line.im * im,
			im: line.re * im + line.im * re
		});
	}
	return lines;
}

/** A line of power `powerMw` and phase `phaseRad`. */
export const lineOf = (frequencyHz: number, powerMw: number, phaseRad: number): Line => ({
	frequencyHz,
	re: Math.sqrt(powerMw) * Math.cos(phaseRad),
	im: Math.sqrt(powerMw) * Math.sin(phaseRad)
});
