import type { Density } from './emitter-kind';

/** The same spectrum with `factor` times the power. */
export const scaleDensity = (density: Density, factor: number): Density => ({
	...density,
	powerMw: density.powerMw * factor,
	densityMwPerHz: (frequencyHz) => factor * density.densityMwPerHz(frequencyHz)
});
