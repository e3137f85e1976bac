import { setTimeout as sleep } from 'node:timers/promises';

/** How far a stream may lag and still catch up, s. Beyond it the reader is slow, and the bench waits for the reader. */
const SLACK_S = 0.1;

/** Keeps the bench clock of one stream with real time. */
export class Pace {
	#benchS: number;
	#realS: number;

	/** @param speedUp bench seconds per real second */
	constructor(
		benchS: number,
		readonly speedUp: number
	) {
		this.#benchS = benchS;
		this.#realS = realNowS();
	}

	/** Resolves once the bench clock stands at `benchS`. Rejects with AbortError when `signal` aborts. */
	async until(benchS: number, signal: AbortSignal): Promise<void> {
		const dueS = this.#realS + (benchS - this.#benchS) / this.speedUp;
		const lateS = realNowS() - dueS;
		if (lateS < 0) await sleep(-lateS * 1000, undefined, { signal });
		this.#benchS = benchS;
		this.#realS = Math.max(dueS, realNowS() - SLACK_S);
		signal.throwIfAborted();
	}
}

const realNowS = (): number => performance.now() / 1000;
