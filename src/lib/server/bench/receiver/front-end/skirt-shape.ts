import type { PhaseNoisePoint } from '$lib/schemas/scene';
import {
	integratedPhaseNoise,
	phaseNoiseAt,
	phaseNoiseIntegral,
	phaseNoiseReachHz
} from '$lib/server/bench/signal/phase-noise';
import { FilteredSkirt, type SkirtShape } from './filtered-skirt';

/** Skirts of a carrier, and what they leave of its line. */
export interface PhaseNoise extends SkirtShape {
	points: PhaseNoisePoint[];
	/** Share of the power that stays in the line: exp(−σ²); the skirts hold the rest, in the shape of L. */
	lineShare: number;
}

const known = new WeakMap<PhaseNoisePoint[], PhaseNoise>();
const tables = new WeakMap<PhaseNoisePoint[], Map<number, FilteredSkirt>>();

/** The skirts of a table of points, worked out once. @throws BenchError naming `field` when the two-sided integral is above 0.1 rad² */
export function phaseNoiseSkirt(points: PhaseNoisePoint[], field?: string): PhaseNoise {
	const noise = known.get(points) ?? skirtOf(points, field);
	known.set(points, noise);
	return noise;
}

/** A skirt through a resolution filter, tabulated once. */
export function filteredSkirtOf(noise: PhaseNoise, rbwHz: number): FilteredSkirt {
	const widths = tables.get(noise.points) ?? new Map<number, FilteredSkirt>();
	tables.set(noise.points, widths);
	const table = widths.get(rbwHz) ?? new FilteredSkirt(noise, rbwHz);
	widths.set(rbwHz, table);
	return table;
}

function skirtOf(points: PhaseNoisePoint[], field: string | undefined): PhaseNoise {
	const variance = integratedPhaseNoise(points, field);
	const scale = variance > 0 ? -Math.expm1(-variance) / variance : 0;
	const within = phaseNoiseIntegral(points);
	return {
		points,
		lineShare: Math.exp(-variance),
		densityPerHz: (offsetHz) => scale * phaseNoiseAt(points, offsetHz),
		powerWithin: (offsetHz) => scale * within(offsetHz),
		endHz: phaseNoiseReachHz(points)
	};
}
