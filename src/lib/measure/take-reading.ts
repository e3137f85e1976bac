/** Takes any reading off any trace. */
import type { Reading, ReadingProblem } from './reading';
import type { ReadingKind, ReadingRequest, RequestOf } from './reading-request';
import { isNoNumber, noNumber, type NoNumber, type Outcome, type Reader } from './reader';
import { readers } from './readers';
import { once, sweepRemarks } from './remarks';
import type { Trace } from './trace';

/**
 * Takes a reading off a trace. Mistaken settings don't stop it: they earn remarks.
 * @returns the number in base units, its spread (one standard deviation) and remarks; a problem only when no number exists
 */
export function takeReading(trace: Trace, request: ReadingRequest): Reading | ReadingProblem {
	const { kind } = request;
	const outcome = unreadable(trace) ?? read(kind, trace, request);
	if (isNoNumber(outcome)) return { kind, ...outcome };
	if (!Number.isFinite(outcome.value) || !Number.isFinite(outcome.spread)) {
		return {
			kind,
			...noNumber('The levels of this trace give no number.', 'levels that a receiver can show')
		};
	}
	const remarks = once([...sweepRemarks(trace), ...outcome.remarks]);
	// Reader and request are of one kind, which the compiler can't follow through the table.
	return { kind, ...outcome, remarks } as Reading;
}

const read = <K extends ReadingKind>(kind: K, trace: Trace, request: ReadingRequest): Outcome<K> =>
	(readers[kind] as Reader<K>)(trace, request as RequestOf<K>);

/** A trace that is still being swept, or that holds what no receiver shows. */
function unreadable(trace: Trace): NoNumber | null {
	const levels = trace.levelsDbm;
	if (levels.length < 2) return noNumber('The trace holds no sweep.', 'a finished sweep');
	for (let i = 0; i < levels.length; i++) {
		if (!Number.isFinite(levels[i]))
			return noNumber(`Point ${i} of the trace has no level.`, 'a finished sweep');
	}
	return null;
}
