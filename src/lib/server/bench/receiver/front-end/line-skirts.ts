/** What the phase-noise skirts of many lines add to the power through the filter. */
import { SKIRT_FROM_RBW, type FilteredSkirt } from './filtered-skirt';

/** A carrier whose skirt counts, and from how far. */
export interface SkirtedLine {
	frequencyHz: number;
	powerMw: number;
	/** Skirts that ride on it: its source's, the receiver's. */
	skirts: readonly FilteredSkirt[];
	/** Tuned distance from which the skirt is power, Hz: 3.5 B, or more about a modulated carrier. */
	fromHz?: number;
	/** Where that distance is counted from, when the line stands for part of a spectrum. */
	aboutHz?: number;
}

/** A skirt that adds less than this share of the floor at its strongest is left out. */
const NEGLIGIBLE = 1e-5;

/**
 * Power of all the skirts through the filter, mW, against the tuned frequency.
 * @param floorMw the least power the receiver shows: what matters is judged against it
 */
export function skirtPower(
	lines: readonly SkirtedLine[],
	rbwHz: number,
	floorMw: number
): (frequencyHz: number) => number {
	const nearestHz = SKIRT_FROM_RBW * rbwHz;
	const counted = lines
		.flatMap((line) =>
			line.skirts.map((skirt) => ({
				skirt,
				frequencyHz: line.frequencyHz,
				powerMw: line.powerMw,
				fromHz: line.fromHz ?? nearestHz,
				aboutHz: line.aboutHz ?? line.frequencyHz
			}))
		)
		.filter(({ skirt, powerMw }) => powerMw * skirt.at(nearestHz) > NEGLIGIBLE * floorMw);
	return (frequencyHz) => {
		let sum = 0;
		for (const line of counted) {
			if (Math.abs(frequencyHz - line.aboutHz) < line.fromHz) continue;
			sum += line.powerMw * line.skirt.at(Math.abs(frequencyHz - line.frequencyHz));
		}
		return sum;
	};
}
