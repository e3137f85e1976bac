/** A preview that follows what is typed: the newest text counts, and one is asked for at a time. */
export class PreviewRun<Asked, Preview> {
	shown = $state.raw<Preview>() as Preview;
	waiting = $state(false);
	problem = $state('');
	#next: { asked: Asked } | null = null;

	constructor(
		first: Preview,
		private readonly make: (asked: Asked) => Promise<Preview>
	) {
		this.shown = first;
	}

	/** Asks for another preview; while one is being made, only the last wish is remembered. */
	async ask(asked: Asked): Promise<void> {
		this.#next = { asked };
		if (this.waiting) return;
		this.waiting = true;
		while (this.#next) {
			const { asked: now } = this.#next as { asked: Asked };
			this.#next = null;
			try {
				this.shown = await this.make(now);
				this.problem = '';
			} catch (cause) {
				this.problem = cause instanceof Error ? cause.message : String(cause);
			}
		}
		this.waiting = false;
	}
}
