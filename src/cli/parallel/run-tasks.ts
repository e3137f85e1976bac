import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { Answer, Task } from './task';

/**
 * Does tasks on all cores, each worker taking the next one as soon as it is free.
 * @param onDone called with each task's number, its result and the processor time it took in s, in the order they come in
 * @throws what the first task that fails throws; the others are given up then
 */
export async function runTasks<T extends Task>(
	tasks: readonly T[],
	onDone: (index: number, result: Answer<T>, cpuS: number) => void
): Promise<void> {
	let next = 0;
	const workers = Array.from({ length: Math.min(tasks.length, availableParallelism()) }, newWorker);
	try {
		await Promise.all(
			workers.map(async (worker) => {
				while (next < tasks.length) {
					const index = next++;
					const { result, cpuS } = await ask(worker, tasks[index]);
					onDone(index, result, cpuS);
				}
			})
		);
	} finally {
		await Promise.all(workers.map((worker) => worker.terminate()));
	}
}

const newWorker = (): Worker =>
	new Worker(new URL('./worker.js', import.meta.url), {
		workerData: { module: new URL('./work.ts', import.meta.url).href }
	});

/** What a worker answers: the result, or what it threw, field and all. */
export type Reply = { result: unknown; cpuS: number } | { fault: { message: string; field?: string } };

function ask<T extends Task>(worker: Worker, task: T): Promise<{ result: Answer<T>; cpuS: number }> {
	return new Promise((resolve, reject) => {
		worker.once('error', reject);
		worker.once('message', (reply: Reply) => {
			worker.off('error', reject);
			if ('result' in reply) resolve({ result: reply.result as Answer<T>, cpuS: reply.cpuS });
			else reject(new TaskFault(reply.fault.message, reply.fault.field));
		});
		worker.postMessage(task);
	});
}

/** A task's fault: a refusal when it has a field, else a bug. */
export class TaskFault extends Error {
	constructor(
		message: string,
		readonly field: string | undefined
	) {
		super(message);
		this.name = 'TaskFault';
	}
}
