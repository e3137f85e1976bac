/** The one door to grading: a small pool of threads, so that no sweep waits while an attempt is graded. */
import type { Finding } from '$lib/schemas/finding';
import { ThreadPool } from '../process/thread-pool';
import type { GradingJob } from './grading-worker';

const threads = new ThreadPool<GradingJob, Finding>('grading', () => import('./grading-worker'));

/**
 * Grades an attempt in a thread of its own.
 * @throws what grading throws, and when the thread ends: nothing is lost, the attempt is as it was
 */
export const gradeInWorker = (job: GradingJob): Promise<Finding> => threads.ask(job);
