/** Phase noise between 1.5 and 3.5 B from its line, in long buckets: there it is a power; nearer it only turns the line's phase. */
import type { PhaseNoisePoint } from '$lib/schemas/scene';
import type { Frame } from './frame';
import { FilteredSkirt, SKIRT_FROM_RBW } from './front-end/filtered-skirt';
import { phaseNoiseSkirt } from './front-end/skirt-shape';
import type { IncidentLine } from './incident';

const INNERMOST_RBW = 1.5;

export class InnerSkirts {
	private readonly lines: { frequencyHz: number; powerMw: number; skirt: FilteredSkirt }[];

	constructor(
		private readonly frame: Frame,
		lines: IncidentLine[]
	) {
		const made = new Map<PhaseNoisePoint[], FilteredSkirt>();
		this.lines = lines.flatMap((line) =>
			(line.skirt ?? []).map((points) => {
				const noise = phaseNoiseSkirt(points);
				const skirt = made.get(points) ?? new FilteredSkirt(noise, frame.rbwHz);
				made.set(points, skirt);
				const powerMw = (line.re * line.re + line.im * line.im) / noise.lineShare;
				return { frequencyHz: line.frequencyHz, powerMw, skirt };
			})
		);
	}

	/** Power of the skirts through the filter tuned to a frequency, mW. */
	at(tunedHz: number): number {
		const { rbwHz } = this.frame;
		let sum = 0;
		for (const { frequencyHz, powerMw, skirt } of this.lines) {
			const away = Math.abs(tunedHz - frequencyHz);
			if (away >= INNERMOST_RBW * rbwHz && away < SKIRT_FROM_RBW * rbwHz) sum += powerMw * skirt.at(away);
		}
		return sum;
	}
}
