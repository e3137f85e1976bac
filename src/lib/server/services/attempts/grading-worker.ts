/**
 * Grading in a thread of its own: the taught method is played again there, which takes longer than a server may stand still.
 * The pool (`grade-in-worker.ts`) starts this very module as a worker; anywhere else it does nothing.
 */
import { parentPort, workerData } from 'node:worker_threads';
import type { Exercise } from '$lib/schemas/exercise';
import type { Finding } from '$lib/schemas/finding';
import type { AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';

/** What there is to grade. */
export interface GradingJob {
	seed: string;
	definition: Exercise;
	record: AttemptRecord;
}
export type GradingReply = { job: number } & ({ finding: Finding } | { fault: string });

/** Whether this is a thread of the pool, and not whoever else loads this module. */
const isGrading = (workerData as { start?: string } | null)?.start === 'grading';
/** Where this module is: in a build, its chunk. */
export const workerUrl = import.meta.url;

export function grade({ seed, definition, record }: GradingJob): Finding {
	return gradeAnswer({ drawn: drawExercise(definition, seed), ...record });
}

if (isGrading) {
	parentPort?.on('message', ({ job, ...asked }: GradingJob & { job: number }) => {
		parentPort?.postMessage(reply(job, asked));
	});
}

function reply(job: number, asked: GradingJob): GradingReply {
	try {
		return { job, finding: grade(asked) };
	} catch (cause) {
		return { job, fault: cause instanceof Error ? (cause.stack ?? cause.message) : String(cause) };
	}
}
