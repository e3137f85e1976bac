/** The one door to grading: a small pool of threads, so that no sweep waits while an attempt is graded. */
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { Finding } from '$lib/schemas/finding';
import type { GradingJob, GradingReply } from './grading-worker';

/** One core is left to the server itself. */
const MOST_WORKERS = Math.max(1, Math.min(4, availableParallelism() - 1));

interface Waiting {
	resolve(finding: Finding): void;
	reject(cause: Error): void;
}

class GradingThread {
	readonly #waiting = new Map<number, Waiting>();
	#next = 0;
	isGone = false;

	constructor(private readonly worker: Worker) {
		worker.on('message', (reply: GradingReply) => {
			const waiting = this.#waiting.get(reply.job);
			this.#waiting.delete(reply.job);
			if ('finding' in reply) waiting?.resolve(reply.finding);
			else waiting?.reject(new Error(reply.fault));
		});
		worker.on('error', (cause) => this.#giveUp(cause instanceof Error ? cause : new Error(String(cause))));
		worker.on('exit', () => this.#giveUp(new Error('The grading thread ended')));
		// A process that has nothing else left to do may end.
		worker.unref();
	}

	get load(): number {
		return this.#waiting.size;
	}

	grade(asked: GradingJob): Promise<Finding> {
		return new Promise((resolve, reject) => {
			const job = this.#next++;
			this.#waiting.set(job, { resolve, reject });
			this.worker.postMessage({ ...asked, job });
		});
	}

	#giveUp(cause: Error): void {
		this.isGone = true;
		for (const { reject } of this.#waiting.values()) reject(cause);
		this.#waiting.clear();
	}
}

let threads: GradingThread[] = [];

/**
 * Grades an attempt in a thread of its own.
 * @throws what grading throws, and when the thread ends: nothing is lost, the attempt is as it was
 */
export async function gradeInWorker(job: GradingJob): Promise<Finding> {
	const url = await startUrl();
	threads = threads.filter(({ isGone }) => !isGone);
	const idle = threads.find(({ load }) => load === 0);
	if (!idle && threads.length < MOST_WORKERS) threads.push(new GradingThread(newWorker(url)));
	const thread = idle ?? threads.reduce((least, next) => (next.load < least.load ? next : least));
	return thread.grade(job);
}

/** Asked for when first needed, so that a build keeps the worker in a chunk of its own. */
const startUrl = async (): Promise<URL> => new URL((await import('./grading-worker')).workerUrl);

/** What the worker knows its start by: see `isGrading` there. */
const GRADING = 'grading';
/** Starts TypeScript in a thread: for Vite's development server and the tests, which run the sources. */
const STARTER = '../../../../cli/parallel/worker.js';

function newWorker(url: URL): Worker {
	const isBuilt = !url.pathname.endsWith('.ts');
	return new Worker(isBuilt ? url : new URL(STARTER, url), {
		workerData: { start: GRADING, module: url.href }
	});
}
