/** One cluster of densities and lines on one frequency grid, as autocorrelations. */
import FFT from 'fft.js';
import type { Line } from './emitter-kind';
import type { Cluster, CoreDensity } from './regrowth-clusters';

/** Fast Fourier transforms by size, made once. */
const transforms = new Map<number, FFT>();
export function transformOf(points: number): FFT {
	let fft = transforms.get(points);
	if (!fft) {
		fft = new FFT(points);
		transforms.set(points, fft);
	}
	return fft;
}

/** Complex autocorrelations over lag, interleaved re, im, about the cluster's reference bin; scaled by 1/points. */
export interface GriddedCluster {
	referenceBin: number;
	/** Of its densities together. */
	density: Float64Array;
	/** Of its lines: ΣP_a·e^{jω_aτ}; null without lines. */
	line: Float64Array | null;
	/** ΣP_a²·e^{2jω_aτ}, scaled by 1/points². */
	lineSquares: Float64Array | null;
	/** ΣP_a², scaled by 1/points². */
	linePowerSquares: number;
}

/** Puts the powers of `cluster` on bins of `stepHz` and transforms. `powerUnit` is the power called 1. */
export function gridCluster(
	cluster: Cluster,
	lines: Line[],
	grid: { stepHz: number; points: number },
	powerUnit: number
): GriddedCluster {
	const { stepHz, points } = grid;
	const referenceBin = Math.round((cluster.startHz + cluster.stopHz) / 2 / stepHz);
	const masses = new Float64Array(2 * points);
	for (const core of cluster.densities) addMasses(masses, core, referenceBin, grid, powerUnit);
	const gridded: GriddedCluster = {
		referenceBin,
		density: inverse(masses, points),
		line: null,
		lineSquares: null,
		linePowerSquares: 0
	};
	if (cluster.lines.length === 0) return gridded;
	const single = new Float64Array(2 * points);
	const squared = new Float64Array(2 * points);
	for (const index of cluster.lines) {
		const line = lines[index];
		const power = (line.re * line.re + line.im * line.im) / powerUnit;
		const bin = Math.round(line.frequencyHz / stepHz) - referenceBin;
		single[2 * wrap(bin, points)] += power;
		squared[2 * wrap(2 * bin, points)] += (power * power) / points;
		gridded.linePowerSquares += (power / points) ** 2;
	}
	gridded.line = inverse(single, points);
	gridded.lineSquares = inverse(squared, points);
	return gridded;
}

/** One density alone, in the same scaling. */
export function gridDensity(
	core: CoreDensity,
	referenceBin: number,
	grid: { stepHz: number; points: number },
	powerUnit: number
): Float64Array {
	const masses = new Float64Array(2 * grid.points);
	addMasses(masses, core, referenceBin, grid, powerUnit);
	return inverse(masses, grid.points);
}

const wrap = (bin: number, points: number): number => ((bin % points) + points) % points;

function addMasses(
	masses: Float64Array,
	{ density, startHz, stopHz }: CoreDensity,
	referenceBin: number,
	{ stepHz, points }: { stepHz: number; points: number },
	powerUnit: number
): void {
	const first = Math.round(startHz / stepHz);
	const last = Math.round(stopHz / stepHz);
	const power = density.powerMw / powerUnit;
	let below = density.cumulative((first - 0.5) * stepHz);
	for (let bin = first; bin <= last; bin++) {
		const upTo = density.cumulative((bin + 0.5) * stepHz);
		masses[2 * wrap(bin - referenceBin, points)] += power * (upTo - below);
		below = upTo;
	}
}

function inverse(masses: Float64Array, points: number): Float64Array {
	const out = new Float64Array(2 * points);
	transformOf(points).inverseTransform(out, masses);
	return out;
}
