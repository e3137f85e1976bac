/** One sweep as a line of the stacked picture: how much ink each pixel gets. */

/**
 * Ink of each pixel, 0 to 255 by level. Where a pixel holds several points it shows the highest, so that a narrow line is
 * never lost; where points stand wider apart than pixels, the nearest.
 * @param levelsDbm evenly spaced over the picture's width; NaN where nothing was swept
 * @param window levels that get no ink and all of it, dBm
 */
export function stackRow(
	levelsDbm: ArrayLike<number>,
	widthPx: number,
	{ topDbm, bottomDbm }: { topDbm: number; bottomDbm: number }
): Uint8ClampedArray {
	const ink = new Uint8ClampedArray(widthPx);
	const points = levelsDbm.length;
	if (points === 0 || widthPx === 0) return ink;
	const perPx = (points - 1) / Math.max(1, widthPx - 1);
	const scale = 255 / (topDbm - bottomDbm);
	for (let px = 0; px < widthPx; px++) {
		const middle = px * perPx;
		const from = Math.max(0, Math.ceil(middle - perPx / 2));
		const to = Math.min(points - 1, Math.floor(middle + perPx / 2));
		let level = levelsDbm[Math.round(middle)];
		for (let i = from; i <= to; i++) if (!(levelsDbm[i] <= level)) level = levelsDbm[i];
		ink[px] = Number.isNaN(level) ? 0 : (level - bottomDbm) * scale;
	}
	return ink;
}
