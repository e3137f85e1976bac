/**
 * How far noise lets a trace stray. Noise behind a Gaussian filter of width B gives κ·B·t independent values in t seconds:
 * κ = 1.5054 for power, 1.8459 for dB (1.5054·(π²/6)/ζ(5/2)), 1.553 for voltage. One value strays by 5.570 dB.
 */
import { unhurriedSweepTimeS } from './resolution-filter';
import { isZeroSpan, spanHz, type Trace, type TraceScale } from './trace';

const VALUES_PER_RBW_SECOND: Record<TraceScale, number> = { power: 1.5054, log: 1.8459, voltage: 1.553 };
/** Deviation of one value of noise in dB: (10/ln 10)·π/√6. */
export const SINGLE_VALUE_DB = 5.570043;
/** Deviation of a long average in dB times the root of its values: 10/ln 10 for power, that · 2·√(4/π − 1) for voltage. */
const MANY_VALUES_DB: Record<TraceScale, number> = { power: 4.342945, log: SINGLE_VALUE_DB, voltage: 4.5403 };

export const videoBandwidthHz = (trace: Trace): number => trace.vbwHz ?? 3 * trace.rbwHz;
/** Seconds per sweep, as automatic coupling has it when the trace doesn't say. */
export const sweepTimeS = (trace: Trace): number =>
	trace.sweepTimeS ?? unhurriedSweepTimeS(spanHz(trace), trace.rbwHz, videoBandwidthHz(trace));
export const pointTimeS = (trace: Trace): number => sweepTimeS(trace) / (trace.levelsDbm.length - 1);

const rows = (trace: Trace): number => (trace.mode === 'live' ? 1 : (trace.count ?? 1));
const averagedRows = (trace: Trace): number => (isHeld(trace) ? 1 : rows(trace));
export const isHeld = (trace: Trace): boolean => trace.mode === 'max-hold' || trace.mode === 'min-hold';

/** x values that a continuous average of x correlation times is worth: x when long, 1 when short. */
const atLeastOne = (x: number): number => x + Math.exp(-x);

/** Independent values averaged into each point of one row, by the video filter (1/(π·VBW) long) and the average detector. */
function valuesInPoint(trace: Trace): number {
	const bucketS = trace.detector === 'average' ? pointTimeS(trace) : 0;
	const averagedS = bucketS + 1 / (Math.PI * videoBandwidthHz(trace));
	return atLeastOne(VALUES_PER_RBW_SECOND[trace.scale] * trace.rbwHz * averagedS);
}

/** Whether a point is a mean on the scale, of rows or within a row, rather than one value of the noise. */
export const isAveraged = (trace: Trace): boolean =>
	averagedRows(trace) > 1 || valuesInPoint(trace) > 1.3 || trace.detector === 'average';

/** Independent values in `points` neighbouring points, all rows together. Points closer than 1/B hold no more than their time does. */
export function independentValues(trace: Trace, points: number): number {
	const seconds = points * pointTimeS(trace) + 1 / (Math.PI * videoBandwidthHz(trace));
	const inTime = atLeastOne(VALUES_PER_RBW_SECOND[trace.scale] * trace.rbwHz * seconds);
	return averagedRows(trace) * Math.min(points * valuesInPoint(trace), inTime);
}

/**
 * Deviation in dB of a mean of `values` independent values on a scale: that of one value for 1, falling with the root.
 * The second term makes it right at 1 and follows 4.343·√ψ′(N), the law of a power average, within 1 %.
 */
export function averageSpreadDb(scale: TraceScale, values: number): number {
	const many = MANY_VALUES_DB[scale] ** 2;
	return Math.sqrt(many / values + (SINGLE_VALUE_DB ** 2 - many) / values ** 2);
}

/** Deviation in dB of the largest of N values: 5.570/H_N^1.04, H_N the harmonic number (Rényi's law within 4 %). */
function maximumSpreadDb(values: number): number {
	const harmonicNumber = Math.log(values) + 0.5772 + 0.4228 / values;
	return SINGLE_VALUE_DB / harmonicNumber ** 1.04;
}

/**
 * Deviation in dB of the mean of `points` neighbouring points that show noise, as this detector and trace mode have it.
 * @param scale what the mean is taken on; absent: powers, which for points that are averages themselves comes to their own scale
 */
export function noiseSpreadDb(
	trace: Trace,
	points: number,
	scale: TraceScale = isAveraged(trace) ? trace.scale : 'power'
): number {
	// Rise-fall shows crests on every other point: they carry what power it shows.
	const peaked =
		trace.detector === 'positive-peak' || trace.detector === 'rise-fall' || trace.mode === 'max-hold';
	const lowest = trace.detector === 'negative-peak' || trace.mode === 'min-hold';
	if (!peaked && !lowest) return averageSpreadDb(scale, independentValues(trace, points));
	const bucketValues = atLeastOne(VALUES_PER_RBW_SECOND.power * trace.rbwHz * pointTimeS(trace));
	const heldRows = trace.mode === 'max-hold' ? rows(trace) : 1;
	const onePointDb = peaked ? maximumSpreadDb(bucketValues * heldRows) : SINGLE_VALUE_DB;
	const apart = atLeastOne(VALUES_PER_RBW_SECOND.power * trace.rbwHz * points * pointTimeS(trace));
	return onePointDb / Math.sqrt(averagedRows(trace) * Math.min(points, apart));
}

/**
 * Deviation in dB of a sum of the powers of points that show noise.
 * @param effectivePoints (Σp)²/Σp² of what the trace shows: its own chance makes them look fewer, by 1 + 1/n for n values a point
 */
export const sumSpreadDb = (trace: Trace, effectivePoints: number): number =>
	noiseSpreadDb(trace, effectivePoints * (1 + 1 / independentValues(trace, 1)));

/** Deviation in dB of one point that shows noise. */
export const pointSpreadDb = (trace: Trace): number => noiseSpreadDb(trace, 1);

/** Points from one value of the noise to the next that knows nothing of it. */
export function independentLag(trace: Trace): number {
	const seconds = Math.max(0.7 / trace.rbwHz, 0.35 / videoBandwidthHz(trace));
	const lag = Math.max(1, Math.ceil(seconds / pointTimeS(trace)));
	// Rise-fall shows maxima on even points and minima on odd ones: compare like with like.
	return trace.detector === 'rise-fall' ? lag + (lag % 2) : lag;
}

/** Whether the sweep runs faster than the filters follow. */
export const isSweptTooFast = (trace: Trace): boolean =>
	!isZeroSpan(trace) &&
	trace.sweepTimeS !== undefined &&
	trace.sweepTimeS < unhurriedSweepTimeS(spanHz(trace), trace.rbwHz, videoBandwidthHz(trace)) * (1 - 1e-9);
