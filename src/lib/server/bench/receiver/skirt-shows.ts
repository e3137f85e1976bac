/** Whether a line's phase noise within 3.5 B of it shows at all beside the noise, and beside the lines around it. */
import type { PhaseNoisePoint } from '$lib/schemas/scene';
import { phaseNoiseIntegral } from '../signal/phase-noise';
import type { Frame } from './frame';
import type { IncidentLine } from './incident';

/** Against the noise, and against other lines, a skirt weaker than this is left out. */
const NEGLIGIBLE = 1e-3;
const HIDDEN = 1e-2;
/** Where it would be seen, in B: clear of its own line, and not yet a density. */
const PLACES = [-3.2, -2.5, -1.8, 1.8, 2.5, 3.2];

const powerOf = ({ re, im }: IncidentLine): number => re * re + im * im;

export function skirtShows(
	line: IncidentLine,
	skirts: PhaseNoisePoint[][],
	lines: IncidentLine[],
	frame: Frame,
	floorMw: number
): boolean {
	const { rbwHz, c } = frame;
	const near = skirts.reduce((sum, points) => {
		const within = phaseNoiseIntegral(points);
		return sum + within(3.5 * rbwHz) - within(rbwHz);
	}, 0);
	const skirtMw = powerOf(line) * near;
	if (skirtMw <= NEGLIGIBLE * floorMw) return false;
	const around = lines.filter(
		(other) => other !== line && Math.abs(other.frequencyHz - line.frequencyHz) < 8 * rbwHz
	);
	return PLACES.some((place) => {
		const tuned = line.frequencyHz + place * rbwHz;
		const beside = around.reduce(
			(sum, other) => sum + powerOf(other) * Math.exp(-2 * c * (other.frequencyHz - tuned) ** 2),
			0
		);
		return skirtMw > HIDDEN * beside;
	});
}
