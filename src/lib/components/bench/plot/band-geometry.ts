/** The bracket of a band reading: two extension lines, a dimension line between them, a figure on it. */
import type { PlotFrame } from './plot-frame';

export interface BandGeometry {
	/** Edges in px, held inside the drawing. */
	x0: number;
	x1: number;
	/** Whether each edge lies inside the window; one that doesn't gets no extension line and no tick. */
	startInside: boolean;
	stopInside: boolean;
	/** Height of the dimension line, px from the top. */
	dimensionY: number;
	/** Middle of the figure, px; it stays wholly inside the drawing. */
	figureX: number;
}

/**
 * Lays out a bracket, or says undefined when the band does not touch the window.
 * @param stack 0 for the lowest bracket; the next stands one row of figures higher
 * @param figureWidthPx how wide the figure and what stands under it may be
 */
export function bandGeometry(
	band: { start: number; stop: number },
	frame: PlotFrame,
	stack = 0,
	figureWidthPx = 120
): BandGeometry | undefined {
	if (band.stop < frame.start || band.start > frame.stop) return undefined;
	const startInside = band.start >= frame.start;
	const stopInside = band.stop <= frame.stop;
	const x0 = startInside ? frame.x(band.start) : frame.leftPx;
	const x1 = stopInside ? frame.x(band.stop) : frame.rightPx;
	const half = figureWidthPx / 2;
	const middle = (x0 + x1) / 2;
	return {
		x0,
		x1,
		startInside,
		stopInside,
		dimensionY: frame.bottomPx - 52 - stack * 58,
		figureX: Math.min(frame.rightPx - half, Math.max(frame.leftPx + half, middle))
	};
}
