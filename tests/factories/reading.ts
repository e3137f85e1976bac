import type { ReadingKind, RequestOf } from '$lib/measure/reading-request';
import type { ReadingOf, ReadingProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';

/** The reading, of a trace that must give one. */
export function readOff<K extends ReadingKind>(trace: Trace, request: RequestOf<K>): ReadingOf<K> {
	const outcome = takeReading(trace, request);
	if ('problem' in outcome) throw new Error(`${outcome.problem} Needs ${outcome.needs}.`);
	return outcome as unknown as ReadingOf<K>;
}

/** The problem, of a trace that must give none. */
export function problemOf(trace: Trace, request: RequestOf<ReadingKind>): ReadingProblem {
	const outcome = takeReading(trace, request);
	if (!('problem' in outcome)) throw new Error(`read ${outcome.value} ${outcome.unit}`);
	return outcome;
}

export const codesOf = ({ remarks }: { remarks: { code: string }[] }): string[] =>
	remarks.map(({ code }) => code);
