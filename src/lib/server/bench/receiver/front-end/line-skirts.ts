/** What the phase-noise skirts of many lines add to the power through the filter. */
import { SKIRT_FROM_RBW, type FilteredSkirt } from './filtered-skirt';

/** A carrier with a skirt that rides on it. */
export interface SkirtedLine {
	frequencyHz: number;
	powerMw: number;
	skirt: FilteredSkirt;
	/** Tuned distance from which the skirt is power, Hz: 3.5 B, or more about a modulated carrier. */
	fromHz?: number;
	/** Where that distance is counted from, when the line stands for part of a spectrum. */
	aboutHz?: number;
}

/** A skirt that adds less than this share of the floor at its strongest is left out. */
const NEGLIGIBLE = 1e-5;

/**
 * Power of all the skirts through the filter, mW, against the tuned frequency; null where none shows.
 * @param floorMw the least power the receiver shows: what matters is judged against it
 */
export function skirtPower(
	lines: readonly SkirtedLine[],
	rbwHz: number,
	floorMw: number
): ((frequencyHz: number) => number) | null {
	const nearestHz = SKIRT_FROM_RBW * rbwHz;
	const counted = lines
		.filter(({ skirt, powerMw }) => powerMw * skirt.at(nearestHz) > NEGLIGIBLE * floorMw)
		.map(({ frequencyHz, powerMw, skirt, fromHz = nearestHz, aboutHz = frequencyHz }) => ({
			frequencyHz,
			powerMw,
			skirt,
			fromHz,
			aboutHz
		}));
	if (counted.length === 0) return null;
	return (frequencyHz) => {
		let sum = 0;
		for (const line of counted) {
			const offsetHz = Math.abs(frequencyHz - line.frequencyHz);
			if (Math.abs(frequencyHz - line.aboutHz) >= line.fromHz) sum += line.powerMw * line.skirt.at(offsetHz);
			// a carrier that moves through the filter is elsewhere most of the time: its skirt stays, no nearer than 3.5 B
			else if (line.fromHz > nearestHz) sum += line.powerMw * line.skirt.at(Math.max(nearestHz, offsetHz));
		}
		return sum;
	};
}
