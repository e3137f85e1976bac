/** A line of the spectrum: where its top lies between the points, and how high. */
import { nearestPoint, frequencyAt, stepHz, type Trace } from './trace';

export interface SpectralLine {
	/** Nearest point. */
	index: number;
	frequencyHz: number;
	levelDbm: number;
}

/** The highest line within ± `reachHz` of a frequency on the trace. Only for a span above 0. */
export function findLine(trace: Trace, nearHz: number, reachHz: number): SpectralLine {
	const levels = trace.levelsDbm;
	const reach = Math.max(1, Math.round(reachHz / stepHz(trace)));
	const middle = nearestPoint(trace, nearHz);
	let index = middle;
	for (let i = Math.max(0, middle - reach); i <= Math.min(levels.length - 1, middle + reach); i++) {
		if (levels[i] > levels[index]) index = i;
	}
	return lineAt(trace, index);
}

/** Whether neighbouring points stand on the same line: at most half a resolution bandwidth apart. */
export const isResolved = (trace: Trace): boolean => stepHz(trace) <= trace.rbwHz / 2;

/** The line whose highest point is `index`. */
export function lineAt(trace: Trace, index: number): SpectralLine {
	const levels = trace.levelsDbm;
	const plain = { index, frequencyHz: frequencyAt(trace, index), levelDbm: levels[index] };
	if (index === 0 || index === levels.length - 1 || !isResolved(trace)) return plain;
	const [a, b, c] = [levels[index - 1], levels[index], levels[index + 1]];
	if (a > b || c > b || a + c === 2 * b) return plain;
	// The Gaussian filter is a parabola in dB, so three points give its top exactly.
	const shift = (a - c) / (2 * (a - 2 * b + c));
	const findsTop = trace.detector === 'positive-peak' || trace.detector === 'rise-fall';
	return {
		index,
		frequencyHz: frequencyAt(trace, index + shift),
		levelDbm: findsTop ? b : b - ((a - c) * shift) / 4
	};
}
