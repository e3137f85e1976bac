import { claimJob, endJob, LEASE_MS, renewLease } from './claim-job';

/** How a handler says how far it is, and hears whether it should go on. */
export interface JobContext {
	/** Throws JobGone when the job was cancelled or taken over: nothing that follows would count. */
	progress(done: number, total: number): Promise<void>;
}
/** Does jobs of one kind. What it throws fails the job; it may be begun again after a crash, so that its effect must bear that. */
export type JobHandler = (payload: unknown, context: JobContext) => Promise<void>;
export type JobHandlers = Readonly<Record<string, JobHandler>>;

/** The job is no longer this runner's. */
export class JobGone extends Error {
	override name = 'JobGone';
}

/**
 * Claims one job and does it.
 * @param clock says what time it is
 * @param onFault is told of what a handler throws, which is a bug
 * @returns whether there was one
 */
export async function runJob(
	handlers: JobHandlers,
	clock: () => Date,
	onFault: (cause: unknown) => void = () => undefined
): Promise<boolean> {
	const job = await claimJob(Object.keys(handlers), clock());
	if (!job) return false;
	if (job.state !== 'running') return true;
	const state = { done: 0, total: job.total, gone: false };
	const beat = async () => {
		if (!(await renewLease(job, { done: state.done, total: state.total }, clock()))) state.gone = true;
	};
	const heart = setInterval(() => void beat().catch(onFault), LEASE_MS / 3);
	heart.unref();
	try {
		await handlers[job.kind](job.payload, {
			async progress(done, total) {
				Object.assign(state, { done, total });
				await beat();
				if (state.gone) throw new JobGone('The job was cancelled or taken over');
			}
		});
		await endJob(job, { state: 'done' }, clock());
	} catch (cause) {
		if (!(cause instanceof JobGone)) {
			onFault(cause);
			const problem = cause instanceof Error ? cause.message : String(cause);
			await endJob(job, { state: 'failed', problem }, clock());
		}
	} finally {
		clearInterval(heart);
	}
	return true;
}
