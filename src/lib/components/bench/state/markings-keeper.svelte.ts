/** Keeps what lies on the bench with the attempt, a moment after it last changed. */
import type { Markings } from '$lib/schemas/markings';
import { Refusal, type BenchWire } from './bench-wire';

/** How long nothing must have changed before it is kept, ms; and before asking again when it failed. */
const restMs = 500;
const retryMs = 5000;

export class MarkingsKeeper {
	/** It could not be kept, and is being tried again. */
	failing = $state(false);
	readonly #wire: BenchWire;
	#wanted: Markings | undefined;
	#kept: string;
	#timer: ReturnType<typeof setTimeout> | undefined;

	/** @param kept as the server has it */
	constructor(kept: Markings, wire: BenchWire) {
		this.#wire = wire;
		this.#kept = JSON.stringify(kept);
	}

	/** Asks for `markings` to be kept in place of what was asked for before. */
	keep(markings: Markings): void {
		this.#wanted = markings;
		clearTimeout(this.#timer);
		if (JSON.stringify(markings) !== this.#kept) this.#timer = setTimeout(() => void this.#send(), restMs);
	}

	/** Keeps at once what waits to be kept: the page is going. */
	flush(): void {
		clearTimeout(this.#timer);
		if (this.#wanted && JSON.stringify(this.#wanted) !== this.#kept) void this.#send(true);
	}

	async #send(leaving = false): Promise<void> {
		const markings = this.#wanted;
		if (!markings) return;
		try {
			await this.#wire.saveMarkings(markings, leaving);
			this.#kept = JSON.stringify(markings);
			this.failing = false;
		} catch (error) {
			// The attempt was handed in elsewhere, or this is no marking: asking again would change nothing.
			if (error instanceof Refusal && error.status < 500) return;
			this.failing = true;
			this.#timer = setTimeout(() => void this.#send(), retryMs);
		}
	}
}
