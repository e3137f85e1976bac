/** Which rows have been painted, and how the server is told of them: only those are evidence. */

/** Drawn rows are told to the server at most this often, ms. */
const tellEveryMs = 1000;

export class DrawnRows {
	readonly #acknowledge: (row: number) => Promise<void>;
	#drawnTo: number | undefined;
	#toldTo: number | undefined;
	#toldAtMs = 0;
	/** The last telling: they go one after another, so that none arrives late. */
	#telling: Promise<void> = Promise.resolve();

	/** @param acknowledge tells the server that every row up to this one was drawn */
	constructor(acknowledge: (row: number) => Promise<void>) {
		this.#acknowledge = acknowledge;
	}

	isNew(row: number): boolean {
		return row > (this.#drawnTo ?? -1);
	}

	/** Every row up to this one has been painted. */
	upTo(row: number | undefined): void {
		this.#drawnTo = row ?? this.#drawnTo;
	}

	/** Whether it is time to tell again. */
	isDue(): boolean {
		return performance.now() - this.#toldAtMs >= tellEveryMs;
	}

	/** Tells what was drawn, after whatever is still being told. */
	tell(): Promise<void> {
		this.#toldAtMs = performance.now();
		const told = this.#telling.then(() => this.#tellNow());
		this.#telling = told.catch(() => undefined);
		return told;
	}

	async #tellNow(): Promise<void> {
		const drawnTo = this.#drawnTo;
		if (drawnTo === undefined || drawnTo === this.#toldTo) return;
		await this.#acknowledge(drawnTo);
		this.#toldTo = drawnTo;
	}
}
