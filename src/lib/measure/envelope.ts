/** The envelope over time, in span 0: where it rises and falls. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { pointTimeS } from './noise-statistics';
import type { Trace } from './trace';

/** An instant when the envelope passed the middle between its low and its high level. */
export interface Edge {
	rising: boolean;
	timeS: number;
	/** Duration between 10 % and 90 % of the step; undefined when the trace begins or ends within it. */
	durationS?: number;
}

export interface Envelope {
	/** Typical high and low voltage, √mW. */
	high: number;
	low: number;
	/** Standard deviation of the high level, √mW, from the median distance to it. */
	scatter: number;
	edges: Edge[];
}

/** Voltages of the envelope, √mW. */
export const voltagesOf = (trace: Trace): Float64Array =>
	Float64Array.from(trace.levelsDbm, (levelDbm) => dbmToMilliwatts(levelDbm / 2));

export function envelopeOf(trace: Trace): Envelope {
	const voltages = voltagesOf(trace);
	let [top, bottom] = [-Infinity, Infinity];
	for (const v of voltages) {
		top = Math.max(top, v);
		bottom = Math.min(bottom, v);
	}
	const middle = (top + bottom) / 2;
	const highs = voltages.filter((v) => v >= middle);
	const high = median(highs);
	// 1.4826 times the median distance is the deviation of a normal law; edges hardly count in it.
	const scatter = 1.4826 * median(highs.map((v) => Math.abs(v - high)));
	const low = median(voltages.filter((v) => v <= middle));
	return { high, low, scatter, edges: findEdges(voltages, low, high, pointTimeS(trace)) };
}

export function median(values: Float64Array | number[]): number {
	const sorted = Float64Array.from(values).sort();
	const half = sorted.length >> 1;
	return sorted.length % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
}

/** Crossings of the middle that go on to 70 % or 30 % of the step: noise on a level makes none. */
function findEdges(voltages: Float64Array, low: number, high: number, stepS: number): Edge[] {
	const at = (share: number) => low + share * (high - low);
	const edges: Edge[] = [];
	let isHigh = voltages[0] >= at(0.5);
	for (let i = 1; i < voltages.length; i++) {
		if (isHigh ? voltages[i] > at(0.3) : voltages[i] < at(0.7)) continue;
		isHigh = !isHigh;
		const middle = crossBack(voltages, i, at(0.5));
		if (middle === undefined) continue;
		const start = crossBack(voltages, Math.ceil(middle), at(isHigh ? 0.1 : 0.9));
		const end = crossForward(voltages, Math.floor(middle), at(isHigh ? 0.9 : 0.1));
		const durationS = start === undefined || end === undefined ? undefined : (end - start) * stepS;
		edges.push({ rising: isHigh, timeS: middle * stepS, durationS });
	}
	return edges;
}

const passes = (a: number, b: number, level: number): boolean => a < level !== b < level;
const between = (a: number, b: number, level: number): number => (level - a) / (b - a);

/** The last crossing of a level before point `from`, in points. */
function crossBack(voltages: Float64Array, from: number, level: number): number | undefined {
	for (let i = from; i > 0; i--) {
		if (passes(voltages[i - 1], voltages[i], level))
			return i - 1 + between(voltages[i - 1], voltages[i], level);
	}
	return undefined;
}

/** The first crossing of a level after point `from`, in points. */
function crossForward(voltages: Float64Array, from: number, level: number): number | undefined {
	for (let i = from; i + 1 < voltages.length; i++) {
		if (passes(voltages[i], voltages[i + 1], level)) return i + between(voltages[i], voltages[i + 1], level);
	}
	return undefined;
}

/** Times from each rise to the next fall. */
export const onTimesS = ({ edges }: Envelope): number[] =>
	edges.flatMap((edge, i) => (edge.rising && edges[i + 1] ? [edges[i + 1].timeS - edge.timeS] : []));

/** Times from each rise to the next. */
export function periodsS({ edges }: Envelope): number[] {
	const rises = edges.filter(({ rising }) => rising).map(({ timeS }) => timeS);
	return rises.slice(1).map((timeS, i) => timeS - rises[i]);
}
