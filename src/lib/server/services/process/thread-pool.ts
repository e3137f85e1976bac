/** Threads for what a server may not stand still for. */
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { ThreadReply } from './answer-in-thread';

/** One core is left to the server itself. */
const MOST_THREADS = Math.max(1, Math.min(4, availableParallelism() - 1));

interface Waiting {
	resolve(answer: unknown): void;
	reject(cause: Error): void;
}

class Thread {
	readonly #waiting = new Map<number, Waiting>();
	#next = 0;
	isGone = false;

	constructor(private readonly worker: Worker) {
		worker.on('message', (reply: ThreadReply) => {
			const waiting = this.#waiting.get(reply.number);
			this.#waiting.delete(reply.number);
			if ('fault' in reply) waiting?.reject(new Error(reply.fault));
			else waiting?.resolve(reply.answer);
		});
		worker.on('error', (cause) => this.#giveUp(cause instanceof Error ? cause : new Error(String(cause))));
		worker.on('exit', () => this.#giveUp(new Error('The thread ended')));
		// A process that has nothing else left to do may end.
		worker.unref();
	}

	get load(): number {
		return this.#waiting.size;
	}

	ask(job: unknown): Promise<unknown> {
		return new Promise((resolve, reject) => {
			const number = this.#next++;
			this.#waiting.set(number, { resolve, reject });
			this.worker.postMessage({ number, job });
		});
	}

	#giveUp(cause: Error): void {
		this.isGone = true;
		for (const { reject } of this.#waiting.values()) reject(cause);
		this.#waiting.clear();
	}
}

/** A few threads that all run one module; see `answerInThread`. */
export class ThreadPool<Job, Answer> {
	#threads: Thread[] = [];

	/**
	 * @param start what the module knows its start by
	 * @param load imports the module, when it is first needed, so that a build keeps it in a chunk of its own
	 */
	constructor(
		private readonly start: string,
		private readonly load: () => Promise<{ workerUrl: string }>,
		readonly most = MOST_THREADS
	) {}

	/** @throws what the module throws, and when the thread ends */
	async ask(job: Job): Promise<Answer> {
		const url = new URL((await this.load()).workerUrl);
		this.#threads = this.#threads.filter(({ isGone }) => !isGone);
		const idle = this.#threads.find(({ load }) => load === 0);
		if (!idle && this.#threads.length < this.most) this.#threads.push(new Thread(newWorker(url, this.start)));
		const thread = idle ?? this.#threads.reduce((least, next) => (next.load < least.load ? next : least));
		return thread.ask(job) as Promise<Answer>;
	}
}

/** Starts TypeScript in a thread: for Vite's development server and the tests, which run the sources. */
const STARTER = '/src/cli/parallel/worker.js';

function newWorker(url: URL, start: string): Worker {
	const root = url.href.slice(0, url.href.lastIndexOf('/src/'));
	return new Worker(url.pathname.endsWith('.ts') ? new URL(root + STARTER) : url, {
		workerData: { start, module: url.href }
	});
}
