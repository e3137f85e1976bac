/** How high each bracket stands: beside another where there is room, above it only where they would meet. */
import { bandGeometry } from './band-geometry';
import type { PlotFrame } from './plot-frame';

/** Room between two brackets on one row, px: the oblique ticks reach past their edges. */
const apartPx = 12;

/**
 * The `stack` of each band for `bandGeometry`, in the order given: the lowest row on which neither the bracket nor its figure meets another.
 * @param figureWidthPx how wide a figure and what stands under it may be
 */
export function bandStacks(
	bands: readonly { start: number; stop: number }[],
	frame: PlotFrame,
	figureWidthPx = 120
): number[] {
	const rows: { from: number; to: number }[][] = [];
	return bands.map((band) => {
		const geometry = bandGeometry(band, frame, 0, figureWidthPx);
		if (!geometry) return 0;
		const half = figureWidthPx / 2;
		const from = Math.min(geometry.x0, geometry.figureX - half);
		const to = Math.max(geometry.x1, geometry.figureX + half);
		const free = rows.findIndex((row) =>
			row.every((other) => to + apartPx <= other.from || other.to + apartPx <= from)
		);
		const stack = free < 0 ? rows.length : free;
		(rows[stack] ??= []).push({ from, to });
		return stack;
	});
}
