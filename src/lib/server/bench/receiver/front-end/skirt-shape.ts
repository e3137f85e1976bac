import type { PhaseNoisePoint } from '$lib/schemas/scene';
import {
	integratedPhaseNoise,
	phaseNoiseAt,
	phaseNoiseIntegral,
	phaseNoiseReachHz
} from '$lib/server/bench/signal/phase-noise';
import type { SkirtShape } from './filtered-skirt';

/** Skirts of a carrier, and what they leave of its line. */
export interface PhaseNoise extends SkirtShape {
	points: PhaseNoisePoint[];
	/** Share of the power that stays in the line: exp(−σ²); the skirts hold the rest, in the shape of L. */
	lineShare: number;
}

/** @throws BenchError naming `field` when the two-sided integral is above 0.1 rad² */
export function phaseNoiseSkirt(points: PhaseNoisePoint[], field?: string): PhaseNoise {
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
