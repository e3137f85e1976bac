/** The cells of a trace: point i stands for what lies within half a step of it. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { noiseBandwidthHz } from './resolution-filter';
import { positionOf, stepHz, type Trace } from './trace';

/** A stretch of the trace in points, fractional: cell i reaches from i − ½ to i + ½. */
export interface Stretch {
	from: number;
	to: number;
	/** Whether the band asked for reached beyond the trace. */
	cut: boolean;
}

/** The part of a band that the trace holds; null if it holds none of it. Only for a span above 0. */
export function stretchOf(trace: Trace, startHz: number, stopHz: number): Stretch | null {
	const from = positionOf(trace, startHz);
	const to = positionOf(trace, stopHz);
	const last = trace.levelsDbm.length - 0.5;
	const held = { from: Math.max(-0.5, from), to: Math.min(last, to) };
	if (!(held.to > held.from)) return null;
	// A band asked for to the very ends of the span is whole, whatever the last digit of its edges.
	return { ...held, cut: from < -0.5 - 1e-6 || to > last + 1e-6 };
}

export const wholeStretch = (trace: Trace): Stretch => ({
	from: -0.5,
	to: trace.levelsDbm.length - 0.5,
	cut: false
});

/** First and last point whose cells a stretch touches. */
export function pointsOf(stretch: Stretch): { first: number; last: number } {
	const first = Math.floor(stretch.from + 0.5);
	return { first, last: Math.max(first, Math.ceil(stretch.to - 0.5)) };
}

/** How much of cell `index` lies in the stretch, 0 to 1. */
export const overlap = (stretch: Stretch, index: number): number =>
	Math.max(0, Math.min(index + 0.5, stretch.to) - Math.max(index - 0.5, stretch.from));

export interface CellSum {
	/** Σ p·Δ/noise bandwidth, mW. */
	powerMw: number;
	/** Points of equal power that would weigh as much: (Σp)²/Σp². */
	effectivePoints: number;
}

/**
 * Power in a stretch: each cell by the part of it that lies inside, over the noise bandwidth of the resolution filter.
 * @param weight share of cell `index` that counts, 0 to 1; absent: its overlap with the stretch
 */
export function sumCells(
	trace: Trace,
	stretch: Stretch,
	weight: (index: number) => number = (index) => overlap(stretch, index)
): CellSum {
	const { first, last } = pointsOf(stretch);
	let sum = 0;
	let squares = 0;
	for (let i = first; i <= last; i++) {
		const powerMw = weight(i) * dbmToMilliwatts(trace.levelsDbm[i]);
		sum += powerMw;
		squares += powerMw * powerMw;
	}
	const cellsPerNoiseBandwidth = stepHz(trace) / noiseBandwidthHz(trace.rbwHz);
	return { powerMw: sum * cellsPerNoiseBandwidth, effectivePoints: squares > 0 ? (sum * sum) / squares : 1 };
}
