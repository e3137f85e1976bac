import { parentPort, workerData } from 'node:worker_threads';

export type ThreadReply = { number: number } & ({ answer: unknown } | { fault: string });

/**
 * Answers jobs where this module was started as a thread of a `ThreadPool`; anywhere else it does nothing.
 * @param start by which the pool starts it, and nobody else
 */
export function answerInThread<Job>(start: string, work: (job: Job) => unknown): void {
	if ((workerData as { start?: string } | null)?.start !== start) return;
	parentPort?.on('message', ({ number, job }: { number: number; job: Job }) => {
		parentPort?.postMessage(reply(number, () => work(job)));
	});
}

function reply(number: number, work: () => unknown): ThreadReply {
	try {
		return { number, answer: work() };
	} catch (cause) {
		return { number, fault: cause instanceof Error ? (cause.stack ?? cause.message) : String(cause) };
	}
}
