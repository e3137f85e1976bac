/** A trace: what the receiver shows after detection, holds and averages. Everything a reading may know. */

export type TraceDetector = 'rise-fall' | 'positive-peak' | 'negative-peak' | 'sample' | 'average';
/** What the video filter and averages act on: dB, mW or √mW. */
export type TraceScale = 'log' | 'power' | 'voltage';
export type TraceMode = 'live' | 'max-hold' | 'min-hold' | 'average' | 'kept';

export interface Trace {
	startHz: number;
	/** Equal to `startHz` in span 0, where the points lie along the sweep time instead. */
	stopHz: number;
	/** 3 dB width of the Gaussian resolution filter. */
	rbwHz: number;
	/** Absent: three times `rbwHz`, as automatic coupling has it. */
	vbwHz?: number;
	/** Absent: what automatic coupling would take. */
	sweepTimeS?: number;
	detector: TraceDetector;
	scale: TraceScale;
	/** Absent: live. */
	mode?: TraceMode;
	/** Rows that were averaged or held; absent: 1. */
	count?: number;
	/** Loss added back, for the record: it is already in the levels. */
	correctionDb?: number | { frequencyHz: number; db: number }[];
	/** Two points or more, referred to the connector (plus correction), all finite. */
	levelsDbm: ArrayLike<number>;
}

export const spanHz = (trace: Trace): number => trace.stopHz - trace.startHz;
export const isZeroSpan = (trace: Trace): boolean => trace.stopHz === trace.startHz;
/** Distance between neighbouring points, Hz; 0 in span 0. */
export const stepHz = (trace: Trace): number => spanHz(trace) / (trace.levelsDbm.length - 1);
/** Frequency of point `index`; it may be fractional. */
export const frequencyAt = (trace: Trace, index: number): number => trace.startHz + index * stepHz(trace);
/** Where `frequencyHz` falls among the points, fractional and unbounded. Only for a span above 0. */
export const positionOf = (trace: Trace, frequencyHz: number): number =>
	(frequencyHz - trace.startHz) / stepHz(trace);

/** Whether `frequencyHz` lies within the cells of the trace, half a step beyond either end. */
export function covers(trace: Trace, frequencyHz: number): boolean {
	const half = isZeroSpan(trace) ? trace.rbwHz / 2 : stepHz(trace) / 2;
	return frequencyHz >= trace.startHz - half && frequencyHz <= trace.stopHz + half;
}

/** The point nearest to `frequencyHz`, from 0 to the last. */
export function nearestPoint(trace: Trace, frequencyHz: number): number {
	if (isZeroSpan(trace)) return 0;
	const last = trace.levelsDbm.length - 1;
	return Math.min(last, Math.max(0, Math.round(positionOf(trace, frequencyHz))));
}
