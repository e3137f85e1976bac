/** The lines of a spectrum, and the noise beneath them. */
import { findPeaks } from './find-peaks';
import { isResolved, lineAt, type SpectralLine } from './find-line';
import { betweenPointsDb } from './line-level';
import { independentValues, isAveraged, pointSpreadDb } from './noise-statistics';
import { noiseBiasDb } from './scale';
import type { Trace } from './trace';

/** A quarter of all points lie below this: for a spectrum of lines, the noise between them. */
export function floorDbm(trace: Pick<Trace, 'levelsDbm'>): number {
	const sorted = Float64Array.from(trace.levelsDbm).sort();
	return sorted[sorted.length >> 2];
}

/**
 * What a peak must exceed so that it is no crest of the noise. The largest of a thousand single values of noise lies 14 dB
 * over the quarter mark: 18 dB leaves it out, and less where points are averages or extremes. Rise-fall shows minima on odd
 * points, which say nothing about crests.
 */
export function aboveNoiseDbm(trace: Trace): number {
	const levelsDbm =
		trace.detector === 'rise-fall'
			? Float64Array.from({ length: (trace.levelsDbm.length + 1) >> 1 }, (_, i) => trace.levelsDbm[2 * i])
			: trace.levelsDbm;
	return floorDbm({ levelsDbm }) + 3 + 2.7 * pointSpreadDb(trace);
}

/** Lines that stand out of the noise, by frequency, none weaker than `reachDb` below the strongest. */
export function linesOf(trace: Trace, reachDb = 60): SpectralLine[] {
	const lines = findPeaks(trace.levelsDbm, { thresholdDbm: aboveNoiseDbm(trace) }).map((index) =>
		lineAt(trace, index)
	);
	const strongestDbm = Math.max(...lines.map(({ levelDbm }) => levelDbm));
	return lines.filter(({ levelDbm }) => levelDbm >= strongestDbm - reachDb);
}

/** Power of the noise between the lines, from the quarter mark: 5.4 dB under it for single values, less for averages. */
export const noiseBetweenDbm = (trace: Trace): number =>
	floorDbm(trace) + 0.97 * pointSpreadDb(trace) + (isAveraged(trace) ? noiseBiasDb[trace.scale] : 0);

/**
 * Deviation in dB of a line's level above noise of `noiseDbm`: 8.686·√(noise/(2·line)) for one value, less for an average; never more
 * than noise alone. A line that no three points resolve may also stand between two of them.
 */
export function lineSpreadDb(
	trace: Trace,
	levelDbm: number,
	noiseDbm: number = noiseBetweenDbm(trace)
): number {
	const oneValueDb = (20 / Math.LN10 / Math.SQRT2) * 10 ** ((noiseDbm - levelDbm) / 20);
	const besideNoiseDb = Math.min(pointSpreadDb(trace), oneValueDb / Math.sqrt(independentValues(trace, 1)));
	return Math.hypot(besideNoiseDb, isResolved(trace) ? 0 : betweenPointsDb(trace));
}
