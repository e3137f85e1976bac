/** The work of this process that no request waits for. */
import { JobRunner } from '$lib/server/jobs/job-runner';
import type { JobHandlers } from '$lib/server/jobs/run-job';
import { PROVE, proveJob } from '../proofs/prove-job';

/** Every kind of job that there is. */
export const jobHandlers: JobHandlers = { [PROVE]: proveJob };

const runner = new JobRunner(jobHandlers, (cause) => console.error('A job failed:', cause));

export const startBackgroundWork = (): void => runner.start();
export const stopBackgroundWork = (): void => runner.stop();
/** There is something to do: nobody need wait until the next look. */
export const wakeBackgroundWork = (): void => runner.wake();
