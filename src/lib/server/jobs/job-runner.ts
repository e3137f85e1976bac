import { runJob, type JobHandlers } from './run-job';

/** A process looks for jobs this often, besides whenever it has asked for one itself. */
const POLL_MS = 2000;

/** Does jobs, one after the other, until it is stopped. */
export class JobRunner {
	#stopped = false;
	#wake: () => void = () => undefined;
	#woken = false;
	#started = false;

	constructor(
		private readonly handlers: JobHandlers,
		private readonly onFault: (cause: unknown) => void
	) {}

	start(): void {
		if (this.#started) return;
		this.#started = true;
		void this.#run();
	}

	/** Looks for jobs at once. */
	wake(): void {
		this.#woken = true;
		this.#wake();
	}

	/** Takes no further job. One that runs goes on until the process ends; another process takes it over then. */
	stop(): void {
		this.#stopped = true;
		this.wake();
	}

	async #run(): Promise<void> {
		while (!this.#stopped) {
			const found = await runJob(this.handlers, () => new Date(), this.onFault).catch((cause) => {
				// The database may be away for a moment; what is wrong for longer is said again and again.
				this.onFault(cause);
				return false;
			});
			if (!found && !this.#woken) await this.#rest();
			this.#woken = false;
		}
	}

	#rest(): Promise<void> {
		return new Promise((resolve) => {
			const timer = setTimeout(resolve, POLL_MS);
			timer.unref();
			this.#wake = () => {
				clearTimeout(timer);
				resolve();
			};
		});
	}
}
