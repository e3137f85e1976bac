/** A phase-noise skirt through the resolution filter, tabulated once against the distance from its carrier. */
import { NOISE_PER_RBW } from '$lib/measure/resolution-filter';
import { gaussianConstant } from '../resolution-filter';

/** Single-sideband phase noise of a carrier of power 1, the same on both sides. */
export interface SkirtShape {
	/** Density at a distance from the carrier, 1/Hz. */
	densityPerHz(offsetHz: number): number;
	/** Power between the carrier and `offsetHz` ≥ 0 on one side. */
	powerWithin(offsetHz: number): number;
	/** Distance beyond which there is none, Hz. */
	endHz: number;
}

/** Nearer than this to the tuned frequency (in B) a carrier's skirt is phase inside the filter, not power (bench.md §1). */
export const SKIRT_FROM_RBW = 3.5;
const STEPS_PER_RBW = 8;
const REACH = 4 * STEPS_PER_RBW;
/** To this distance (in B) on the lattice; beyond, the filter is narrow against everything the skirt does. */
const NEAR_RBW = 64;
/** Steps of the far table in one factor e. */
const STEPS_PER_E = 48;

export class FilteredSkirt {
	private readonly stepHz: number;
	private readonly nearHz: number;
	private readonly near: Float64Array;
	private readonly far: Float64Array;
	private readonly noiseBandwidthHz: number;
	/** Power from the carrier out on one side, from `withinFromHz` in steps of a factor. */
	private readonly within: Float64Array;
	private readonly withinFromHz: number;
	readonly endHz: number;

	constructor(
		shape: SkirtShape,
		readonly rbwHz: number
	) {
		this.stepHz = rbwHz / STEPS_PER_RBW;
		this.nearHz = NEAR_RBW * rbwHz;
		this.endHz = shape.endHz + 4 * rbwHz;
		this.withinFromHz = this.stepHz / STEPS_PER_RBW;
		const toEnd = Math.max(1, Math.ceil(Math.log(shape.endHz / this.withinFromHz) * STEPS_PER_E));
		this.within = Float64Array.from({ length: toEnd + 1 }, (_, i) =>
			shape.powerWithin(Math.min(shape.endHz, this.withinFromHz * Math.exp(i / STEPS_PER_E)))
		);
		this.near = nearTable(shape, this.stepHz, 2 * gaussianConstant(rbwHz));
		const steps = Math.max(0, Math.ceil(Math.log(shape.endHz / this.nearHz) * STEPS_PER_E));
		this.noiseBandwidthHz = NOISE_PER_RBW * rbwHz;
		this.far = Float64Array.from({ length: steps + 2 }, (_, i) => {
			const offsetHz = Math.min(shape.endHz, this.nearHz * Math.exp(i / STEPS_PER_E));
			return this.noiseBandwidthHz * shape.densityPerHz(offsetHz);
		});
	}

	/** Power through the filter tuned `offsetHz` ≥ 0 from a carrier of power 1. */
	at(offsetHz: number): number {
		if (offsetHz < this.nearHz) {
			const place = offsetHz / this.stepHz;
			const i = Math.floor(place);
			return this.near[i] + (place - i) * (this.near[i + 1] - this.near[i]);
		}
		if (offsetHz > this.endHz) return 0;
		const place = Math.log(offsetHz / this.nearHz) * STEPS_PER_E;
		const i = Math.floor(place);
		if (i + 1 >= this.far.length) return 0;
		return this.far[i] + (place - i) * (this.far[i + 1] - this.far[i]);
	}

	/**
	 * Power through a filter narrow against a band (of power 1, flat) that begins `fromHz` above the tuned frequency and
	 * ends `toHz` above it; either may be negative.
	 */
	ofBand(fromHz: number, toHz: number): number {
		return (this.noiseBandwidthHz * (this.signedPower(toHz) - this.signedPower(fromHz))) / (toHz - fromHz);
	}

	private signedPower(offsetHz: number): number {
		return offsetHz < 0 ? -this.powerWithin(-offsetHz) : this.powerWithin(offsetHz);
	}

	private powerWithin(offsetHz: number): number {
		const { within } = this;
		if (offsetHz <= this.withinFromHz) return (within[0] * offsetHz) / this.withinFromHz;
		const place = Math.log(offsetHz / this.withinFromHz) * STEPS_PER_E;
		const i = Math.floor(place);
		if (i + 1 >= within.length) return within[within.length - 1];
		return within[i] + (place - i) * (within[i + 1] - within[i]);
	}
}

/** Σ over cells of B/8 of (power of the skirt in the cell)·|H|², at every lattice distance below 64 B. */
function nearTable(shape: SkirtShape, stepHz: number, exponent: number): Float64Array {
	const nodes = NEAR_RBW * STEPS_PER_RBW + 2;
	// Power of the skirt from the carrier out, signed: odd about it.
	const within = (offsetHz: number) => Math.sign(offsetHz) * shape.powerWithin(Math.abs(offsetHz));
	const edges = Float64Array.from({ length: nodes + 2 * REACH + 1 }, (_, i) =>
		within((i - REACH - 0.5) * stepHz)
	);
	const gain = Float64Array.from({ length: 2 * REACH + 1 }, (_, i) =>
		Math.exp(-exponent * ((i - REACH) * stepHz) ** 2)
	);
	return Float64Array.from({ length: nodes }, (_, n) => {
		let sum = 0;
		for (let k = 0; k <= 2 * REACH; k++) sum += gain[k] * (edges[n + k + 1] - edges[n + k]);
		return sum;
	});
}
