/** What phase noise rides on, in pieces: lines, and bands of a spectrum. */
import type { Density } from '$lib/server/bench/signal/emitter-kind';
import { frequencyAtShare } from '$lib/server/bench/signal/regrowth-clusters';
import { SKIRT_FROM_RBW } from './filtered-skirt';

/** A carrier, or a flat band of carriers. */
export interface SkirtSource {
	startHz: number;
	stopHz: number;
	powerMw: number;
	/** Tuned frequencies between which its skirt is phase, not power; absent on a band, whose own power is noise already. */
	phaseFromHz?: number;
	phaseToHz?: number;
	/** Distance within which its skirt grows no further, Hz: a line that moves is seldom nearer. */
	leastHz?: number;
}

/** Pieces between two breaks of a density. */
const PIECES = 24;
/** Pieces with less of the power are left out. */
const FAINT = 1e-9;
/** Lines that stand for a spectrum whose skirt matters only away from it. */
const STAND_INS = 16;
/** Share of the power on either side that such a spectrum's width leaves out. */
const OUTSIDE = 0.005;
/** Beyond that width the skirt sets in, in B: the filter passes a signal there with 19 dB less, far more than any skirt. */
const WHOLE_FROM_RBW = 1.25;

/** A line's skirt is phase within 3.5 B of it (bench.md §1). */
export const lineSource = (frequencyHz: number, powerMw: number, rbwHz: number): SkirtSource => ({
	startHz: frequencyHz,
	stopHz: frequencyHz,
	powerMw,
	phaseFromHz: frequencyHz - SKIRT_FROM_RBW * rbwHz,
	phaseToHz: frequencyHz + SKIRT_FROM_RBW * rbwHz
});

/** A line that moves through the filter by its own slow modulation is elsewhere most of the time: its skirt stays, no nearer than 3.5 B. */
export const movingLineSource = (frequencyHz: number, powerMw: number, rbwHz: number): SkirtSource => ({
	startHz: frequencyHz,
	stopHz: frequencyHz,
	powerMw,
	leastHz: SKIRT_FROM_RBW * rbwHz
});

/**
 * A density in flat pieces, cut at its breaks.
 * @param gainAt what each frequency still has to be multiplied by
 */
export function densitySources(
	density: Density,
	powerMw: number,
	gainAt: (frequencyHz: number) => number
): SkirtSource[] {
	const { startHz, stopHz, breaksHz } = density;
	const inner = breaksHz.filter((breakHz) => breakHz > startHz && breakHz < stopHz);
	const knots = [startHz, ...inner.sort((a, b) => a - b), stopHz];
	const sources: SkirtSource[] = [];
	let below = density.cumulative(startHz);
	for (let k = 1; k < knots.length; k++) {
		const pieceHz = (knots[k] - knots[k - 1]) / PIECES;
		for (let i = 0; i < PIECES; i++) {
			const fromHz = knots[k - 1] + i * pieceHz;
			const upTo = density.cumulative(fromHz + pieceHz);
			const share = upTo - below;
			below = upTo;
			if (share <= FAINT) continue;
			const pieceMw = share * powerMw * gainAt(fromHz + pieceHz / 2);
			sources.push({ startHz: fromHz, stopHz: fromHz + pieceHz, powerMw: pieceMw });
		}
	}
	return sources;
}

/**
 * A signal followed as a whole: while the filter is on it its skirt is phase; beside it, that of as many lines of equal power.
 * Its waveform, unlike a line, brings no skirt of its own, so the filter must still see enough of it where the skirt sets in.
 */
export function wholeSources(density: Density, powerMw: number, rbwHz: number): SkirtSource[] {
	const phaseFromHz = frequencyAtShare(density, OUTSIDE) - WHOLE_FROM_RBW * rbwHz;
	const phaseToHz = frequencyAtShare(density, 1 - OUTSIDE) + WHOLE_FROM_RBW * rbwHz;
	return Array.from({ length: STAND_INS }, (_, i) => {
		const frequencyHz = frequencyAtShare(density, (i + 0.5) / STAND_INS);
		return {
			startHz: frequencyHz,
			stopHz: frequencyHz,
			powerMw: powerMw / STAND_INS,
			phaseFromHz,
			phaseToHz
		};
	});
}
