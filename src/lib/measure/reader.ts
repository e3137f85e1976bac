/** What every kind of reading is: a function of trace and request. One file per kind; `readers.ts` lists them. */
import type { ReadingKind, RequestOf } from './reading-request';
import type { ReadingOf, ReadingProblem } from './reading';
import type { Trace } from './trace';

export type ReadNumber<K extends ReadingKind> = Omit<ReadingOf<K>, 'kind'>;
export type NoNumber = Omit<ReadingProblem, 'kind'>;
export type Outcome<K extends ReadingKind> = ReadNumber<K> | NoNumber;
export type Reader<K extends ReadingKind> = (trace: Trace, request: RequestOf<K>) => Outcome<K>;

export const noNumber = (problem: string, needs: string): NoNumber => ({ problem, needs });
export const isNoNumber = (outcome: object): outcome is NoNumber => 'problem' in outcome;

/** For readings along the frequency axis, when there is none. */
export const needsSpan = (): NoNumber =>
	noNumber('In span 0 every point stands at one frequency.', 'a span above 0');

export const outsideTrace = (what: string): NoNumber =>
	noNumber(`${what} lies outside the trace.`, 'a span that holds it');
