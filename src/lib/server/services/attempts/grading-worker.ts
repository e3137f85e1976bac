/**
 * Grading in a thread of its own: the taught method is played again there, which takes longer than a server may stand still.
 * The pool (`grade-in-worker.ts`) starts this very module as a thread.
 */
import type { Exercise } from '$lib/schemas/exercise';
import type { Finding } from '$lib/schemas/finding';
import type { AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { answerInThread } from '../process/answer-in-thread';

/** What there is to grade. */
export interface GradingJob {
	seed: string;
	definition: Exercise;
	record: AttemptRecord;
}

/** Where this module is: in a build, its chunk. */
export const workerUrl = import.meta.url;

export function grade({ seed, definition, record }: GradingJob): Finding {
	return gradeAnswer({ drawn: drawExercise(definition, seed), ...record });
}

answerInThread('grading', grade);
