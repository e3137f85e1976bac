/** The level lines of a plot: one every 20 dB on round figures. */
import { formatFigure } from '$lib/units/format-quantity';

/** What the window shows below its reference, dB. */
export const windowDb = 110;

/**
 * The window's levels under a reference: the reference line itself has a little air above it, so that a trace
 * driven just past it is still seen.
 * @returns top and bottom in dBm, `windowDb` and 6 dB of air apart
 */
export function levelWindow(referenceDbm: number): { topDbm: number; bottomDbm: number } {
	return { topDbm: referenceDbm + 6, bottomDbm: referenceDbm - windowDb };
}

/** Level lines from `topDbm` down to `bottomDbm`, counted from the reference so that the reference has a line. */
export function levelLines(
	referenceDbm: number,
	topDbm: number,
	bottomDbm: number,
	stepDb = 20
): { levelDbm: number; figure: string }[] {
	const decimals = Number.isInteger(referenceDbm) ? 0 : 1;
	const lines = [];
	for (let levelDbm = referenceDbm; levelDbm > bottomDbm + 2; levelDbm -= stepDb) {
		if (levelDbm <= topDbm) lines.push({ levelDbm, figure: formatFigure(levelDbm, decimals) });
	}
	return lines;
}
