/** The window of a plot: which frequencies (in span 0: times) and levels lie where, in CSS pixels. */

/** Room kept around the drawing for its figures, px. */
export interface PlotMargins {
	top: number;
	right: number;
	bottom: number;
	left: number;
}

export interface PlotWindow {
	/** Ends of the axis: Hz, or s for level over time. */
	start: number;
	stop: number;
	/** Level of the top line, dBm. */
	topDbm: number;
	/** Level at the axis, dBm. */
	bottomDbm: number;
}

export interface PlotFrame extends PlotWindow {
	width: number;
	height: number;
	/** Edges of the drawing, px from the left and from the top. */
	leftPx: number;
	rightPx: number;
	topPx: number;
	bottomPx: number;
	/** Place on the axis → px from the left; not clipped. */
	x: (at: number) => number;
	/** Level in dBm → px from the top; not clipped. */
	y: (levelDbm: number) => number;
	/** px from the left → place on the axis, held inside the window. */
	at: (px: number) => number;
}

/** The room that the bench keeps around its drawing. @param morePx for level lines that bear their own unit, at the left */
export const benchMargins = (narrow: boolean, morePx = 0): PlotMargins =>
	narrow
		? { top: 16, right: 12, bottom: 28, left: 36 + morePx }
		: { top: 14, right: 8, bottom: 28, left: 44 + morePx };

/** The level that a trace over a whole window shows at a place; undefined where it holds nothing. */
export function levelAt(
	levelsDbm: ArrayLike<number>,
	{ start, stop }: Pick<PlotWindow, 'start' | 'stop'>,
	at: number
): number | undefined {
	const level = levelsDbm[Math.round(((at - start) / (stop - start)) * (levelsDbm.length - 1))];
	return Number.isNaN(level) ? undefined : level;
}

/**
 * Lays a window of frequency (or time) and level over a drawing of `width` × `height` px. A window without width puts
 * everything in the middle.
 */
export function plotFrame(
	size: { width: number; height: number },
	margins: PlotMargins,
	window: PlotWindow
): PlotFrame {
	const leftPx = margins.left;
	const rightPx = Math.max(leftPx + 1, size.width - margins.right);
	const topPx = margins.top;
	const bottomPx = Math.max(topPx + 1, size.height - margins.bottom);
	const { start, stop, topDbm, bottomDbm } = window;
	const span = stop - start;
	const rangeDb = topDbm - bottomDbm;
	return {
		...window,
		...size,
		leftPx,
		rightPx,
		topPx,
		bottomPx,
		x: (at) => (span > 0 ? leftPx + ((at - start) / span) * (rightPx - leftPx) : (leftPx + rightPx) / 2),
		y: (levelDbm) => topPx + ((topDbm - levelDbm) / rangeDb) * (bottomPx - topPx),
		at: (px) => {
			const share = Math.min(1, Math.max(0, (px - leftPx) / (rightPx - leftPx)));
			return start + share * span;
		}
	};
}
