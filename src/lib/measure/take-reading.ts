/** Takes any reading off any trace. */
import type { Reading, ReadingProblem } from './reading';
import type { ReadingRequest } from './reading-request';
import type { Trace } from './trace';

/**
 * Takes a reading off a trace.
 * @returns the number in base units, its spread (one standard deviation) and remarks; a problem only when no number exists
 */
export declare function takeReading(trace: Trace, request: ReadingRequest): Reading | ReadingProblem;
