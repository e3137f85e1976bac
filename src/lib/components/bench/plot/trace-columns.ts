/** A trace made ready to draw: every point where there is room, else the extremes of each pixel column. */
import type { PlotFrame } from './plot-frame';

/**
 * Points of the line in px, x and y by turns, in the order to draw. With more than two points a pixel each column keeps
 * its highest and lowest, so that a line one point wide is never lost.
 * @param levelsDbm evenly spaced from the frame's start to its stop; NaN where nothing was swept yet: left out
 */
export function traceColumns(levelsDbm: ArrayLike<number>, frame: PlotFrame): Float32Array {
	const points = levelsDbm.length;
	const widthPx = frame.rightPx - frame.leftPx;
	const stepPx = points > 1 ? widthPx / (points - 1) : 0;
	const floorPx = frame.bottomPx;
	const yOf = (levelDbm: number) => Math.min(floorPx, frame.y(levelDbm));
	if (points <= 2 * widthPx) {
		const line = new Float32Array(2 * points);
		let used = 0;
		for (let i = 0; i < points; i++) {
			if (Number.isNaN(levelsDbm[i])) continue;
			line[used++] = frame.leftPx + i * stepPx;
			line[used++] = yOf(levelsDbm[i]);
		}
		return line.subarray(0, used);
	}
	const line: number[] = [];
	let column = -1;
	let high = NaN;
	let low = NaN;
	const close = () => {
		if (column >= 0 && !Number.isNaN(high))
			line.push(frame.leftPx + column, yOf(high), frame.leftPx + column, yOf(low));
	};
	for (let i = 0; i < points; i++) {
		const at = Math.floor(i * stepPx);
		if (at !== column) {
			close();
			column = at;
			high = NaN;
			low = NaN;
		}
		const level = levelsDbm[i];
		if (!(level <= high)) high = Number.isNaN(level) ? high : level;
		if (!(level >= low)) low = Number.isNaN(level) ? low : level;
	}
	close();
	return Float32Array.from(line);
}
