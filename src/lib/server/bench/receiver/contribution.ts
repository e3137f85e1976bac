/** One thing that reaches the filter, added sample by sample to a row in the frame's lattice. */
import type { Frame } from './frame';
import type { Random } from './random';

/** What a row knows of itself. */
export interface RowContext {
	/** Bench clock at the sweep's start, s. */
	clockS: number;
	random(stream: string): Random;
}

export interface Contribution {
	/** Adds its complex amplitude (√mW) to re and im, all `frame.total` samples of them. */
	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void;
}

/** Array indexes during which a line of frequency `lineHz` (at the sweep's start) is within `reachHz` of the tuned frequency. */
export function reachIndexes(
	frame: Frame,
	offsetHz: number,
	passingHzPerS: number,
	reachHz: number
): { from: number; to: number } {
	if (passingHzPerS === 0)
		return Math.abs(offsetHz) <= reachHz ? { from: 0, to: frame.total } : { from: 0, to: 0 };
	const a = (offsetHz - reachHz) / passingHzPerS / frame.stepS + frame.lead;
	const b = (offsetHz + reachHz) / passingHzPerS / frame.stepS + frame.lead;
	const from = Math.max(0, Math.ceil(Math.min(a, b)));
	const to = Math.min(frame.total, Math.floor(Math.max(a, b)) + 1);
	return to > from ? { from, to } : { from: 0, to: 0 };
}

/** 2π times the fraction of a turn: keeps phases small however long the bench has run. */
export const turns = (cycles: number): number => 2 * Math.PI * (cycles - Math.floor(cycles));
