/** Requests for the receiver that were given up before they were answered: one may reach it after the request that followed. */

/** A request that was given up may still come for so long, ms. */
const comesForMs = 5000;

export class Askings {
	#open = false;
	#givenUpAtMs = -Infinity;

	asked(): void {
		this.#open = true;
	}

	answered(): void {
		this.#open = false;
	}

	givenUp(): void {
		if (this.#open) this.#givenUpAtMs = performance.now();
		this.#open = false;
	}

	/** Whether one that was given up may have taken the receiver. */
	mayComeLate(): boolean {
		return performance.now() - this.#givenUpAtMs < comesForMs;
	}

	forget(): void {
		this.#givenUpAtMs = -Infinity;
	}
}
