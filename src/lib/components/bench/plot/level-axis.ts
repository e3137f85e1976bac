/** The levels that a plot shows. */

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
