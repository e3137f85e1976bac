import type { FilteredSkirt } from './filtered-skirt';
import type { SkirtSource } from './skirt-source';

/** Sources this wide against their distance count as one line at their middle: their skirt is then within 0.05 dB. */
const FAR = 0.15;
/** A band this narrow, in B, is a line to the filter. */
const NARROW_RBW = 0.25;
/** Together, sources left out add no more than this share of the floor. */
const NEGLIGIBLE = 3e-3;

/** A stretch of sources; leaves hold one. */
interface Branch {
	startHz: number;
	stopHz: number;
	/** Tuned frequencies at which some of it is phase: there every source is looked at. */
	phaseFromHz: number;
	phaseToHz: number;
	middleHz: number;
	leastHz: number;
	powerMw: number;
	left: Branch | null;
	right: Branch | null;
}

/**
 * Power that the skirts of many sources put through the filter, against the tuned frequency. Far sources are taken together
 * (Barnes & Hut, Nature 324, 446, 1986), so that ten thousand lines cost little more than a hundred.
 */
export class SkirtField {
	private readonly root: Branch;

	private constructor(
		private readonly skirt: FilteredSkirt,
		sources: SkirtSource[]
	) {
		sources.sort((a, b) => a.startHz + a.stopHz - b.startHz - b.stopHz);
		this.root = grow(sources, 0, sources.length);
	}

	/**
	 * @param floorMw the least power the receiver shows; sources that together add nothing to it are left out
	 * @returns null where nothing shows
	 */
	static of(skirt: FilteredSkirt, sources: readonly SkirtSource[], floorMw: number): SkirtField | null {
		const nearestMw = skirt.at(0);
		const counted = [...sources].sort((a, b) => a.powerMw - b.powerMw);
		let leftOutMw = 0;
		let first = 0;
		while (first < counted.length) {
			leftOutMw += counted[first].powerMw * nearestMw;
			if (leftOutMw > NEGLIGIBLE * floorMw) break;
			first++;
		}
		return first === counted.length ? null : new SkirtField(skirt, counted.slice(first));
	}

	/** Power through the filter tuned to `frequencyHz`, mW. */
	at(frequencyHz: number): number {
		return this.from(this.root, frequencyHz);
	}

	private from(branch: Branch, frequencyHz: number): number {
		const { skirt } = this;
		const awayHz = Math.max(branch.leastHz, Math.abs(frequencyHz - branch.middleHz));
		const isPhase = frequencyHz > branch.phaseFromHz && frequencyHz < branch.phaseToHz;
		if (branch.left && branch.right) {
			if (!isPhase && branch.stopHz - branch.startHz < FAR * awayHz) return branch.powerMw * skirt.at(awayHz);
			return this.from(branch.left, frequencyHz) + this.from(branch.right, frequencyHz);
		}
		if (isPhase) return 0;
		const widthHz = branch.stopHz - branch.startHz;
		if (widthHz < NARROW_RBW * skirt.rbwHz || widthHz < FAR * awayHz)
			return branch.powerMw * skirt.at(awayHz);
		return branch.powerMw * skirt.ofBand(branch.startHz - frequencyHz, branch.stopHz - frequencyHz);
	}
}

/** Leaves and inner branches are built alike, so that the engine sees one shape of object in the hot loop. */
function grow(sources: SkirtSource[], from: number, to: number): Branch {
	if (to - from === 1) {
		const {
			startHz,
			stopHz,
			powerMw,
			phaseFromHz = Infinity,
			phaseToHz = -Infinity,
			leastHz = 0
		} = sources[from];
		const middleHz = (startHz + stopHz) / 2;
		return { startHz, stopHz, phaseFromHz, phaseToHz, middleHz, leastHz, powerMw, left: null, right: null };
	}
	const middle = (from + to) >> 1;
	const left = grow(sources, from, middle);
	const right = grow(sources, middle, to);
	const powerMw = left.powerMw + right.powerMw;
	return {
		startHz: Math.min(left.startHz, right.startHz),
		stopHz: Math.max(left.stopHz, right.stopHz),
		phaseFromHz: Math.min(left.phaseFromHz, right.phaseFromHz),
		phaseToHz: Math.max(left.phaseToHz, right.phaseToHz),
		middleHz: (left.middleHz * left.powerMw + right.middleHz * right.powerMw) / powerMw,
		leastHz: Math.max(left.leastHz, right.leastHz),
		powerMw,
		left,
		right
	};
}
