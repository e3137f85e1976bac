/** Sorts what enters a nonlinear stage into clusters that one frequency grid can hold. */
import type { Density, Line } from './emitter-kind';

/** A density with the stretch that holds all but 1e-4 of its power. */
export interface CoreDensity {
	index: number;
	density: Density;
	startHz: number;
	stopHz: number;
}

export interface Cluster {
	startHz: number;
	stopHz: number;
	densities: CoreDensity[];
	/** Indices of lines. */
	lines: number[];
	powerMw: number;
	/** Width of its narrowest density; Infinity where it has lines only. */
	narrowestHz: number;
}

const CORE_TAIL = 5e-5;
/** A cluster may be this many times as wide as its narrowest density: some fifty grid points are left for that. */
const WIDEST = 100;

/** Frequency where `share` of the power lies below, by bisection to 1e-6 of the support. */
export function frequencyAtShare(density: Density, share: number): number {
	let low = density.startHz;
	let high = density.stopHz;
	for (let i = 0; i < 44; i++) {
		const middle = (low + high) / 2;
		if (density.cumulative(middle) < share) low = middle;
		else high = middle;
	}
	return (low + high) / 2;
}

/** The stretch worth putting on a grid: the support, but for tails that hold 1e-4 of the power and most of the width. */
export function coreOf(density: Density, index: number): CoreDensity {
	const startHz = frequencyAtShare(density, CORE_TAIL);
	const stopHz = frequencyAtShare(density, 1 - CORE_TAIL);
	const compact = density.stopHz - density.startHz < 3 * (stopHz - startHz);
	return compact
		? { index, density, startHz: density.startHz, stopHz: density.stopHz }
		: { index, density, startHz, stopHz };
}

/** Neighbours in frequency join while one grid can still resolve the narrowest density among them. */
export function clustersOf(cores: CoreDensity[], lines: { index: number; line: Line }[]): Cluster[] {
	const single: Cluster[] = [
		...cores.map((core) => ({
			startHz: core.startHz,
			stopHz: core.stopHz,
			densities: [core],
			lines: [],
			powerMw: core.density.powerMw,
			narrowestHz: core.stopHz - core.startHz
		})),
		...lines.map(({ index, line }) => ({
			startHz: line.frequencyHz,
			stopHz: line.frequencyHz,
			densities: [],
			lines: [index],
			powerMw: line.re * line.re + line.im * line.im,
			narrowestHz: Infinity
		}))
	].sort((a, b) => a.startHz - b.startHz);
	// Lines alone have no width of their own to go by: the narrowest density of all rules them.
	const narrowestHz = Math.min(...cores.map((core) => core.stopHz - core.startHz));
	const clusters: Cluster[] = [];
	for (const next of single) {
		const last = clusters[clusters.length - 1];
		const joined = last && join(last, next);
		const resolveHz = joined?.densities.length ? joined.narrowestHz : narrowestHz;
		if (joined && joined.stopHz - joined.startHz <= WIDEST * resolveHz)
			clusters[clusters.length - 1] = joined;
		else clusters.push(next);
	}
	return clusters;
}

const join = (a: Cluster, b: Cluster): Cluster => ({
	startHz: Math.min(a.startHz, b.startHz),
	stopHz: Math.max(a.stopHz, b.stopHz),
	densities: [...a.densities, ...b.densities],
	lines: [...a.lines, ...b.lines],
	powerMw: a.powerMw + b.powerMw,
	narrowestHz: Math.min(a.narrowestHz, b.narrowestHz)
});
