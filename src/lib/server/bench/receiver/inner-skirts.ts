/** Phase noise between 1.5 and 3.5 B from its line, in long buckets: there it is a power; nearer it only turns the line's phase. */
import type { Frame } from './frame';
import { SKIRT_FROM_RBW, type FilteredSkirt } from './front-end/filtered-skirt';
import { filteredSkirtOf, phaseNoiseSkirt } from './front-end/skirt-shape';
import type { IncidentLine } from './incident';

const INNERMOST_RBW = 1.5;

export class InnerSkirts {
	private readonly lines: { frequencyHz: number; powerMw: number; skirt: FilteredSkirt }[];

	constructor(
		private readonly frame: Frame,
		lines: IncidentLine[]
	) {
		this.lines = lines.flatMap((line) =>
			(line.skirt ?? []).map((points) => {
				const noise = phaseNoiseSkirt(points);
				const skirt = filteredSkirtOf(noise, frame.rbwHz);
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
