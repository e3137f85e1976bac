/** The proof of an exercise as its desk follows it. */
import type { ProofState } from '$lib/schemas/proof-view';
import type { DeskWire } from './desk-wire';

const LOOK_EVERY_MS = 700;

export class ProofRun {
	state = $state.raw<ProofState>() as ProofState;
	problem = $state('');
	busy = $state(false);
	#timer: ReturnType<typeof setTimeout> | undefined;

	constructor(
		first: ProofState,
		private readonly wire: DeskWire
	) {
		this.state = first;
	}

	get running(): boolean {
		return this.state.job?.state === 'waiting' || this.state.job?.state === 'running';
	}

	/** Goes on looking while it runs; call once the page is there. */
	follow(): void {
		clearTimeout(this.#timer);
		if (this.running) this.#timer = setTimeout(() => void this.look(), LOOK_EVERY_MS);
	}

	leave(): void {
		clearTimeout(this.#timer);
	}

	look = (): Promise<void> => this.#ask(() => this.wire.proof());
	start = (): Promise<void> => this.#ask(() => this.wire.askForProof());
	cancel = (): Promise<void> => this.#ask(() => this.wire.cancelProof());

	async #ask(question: () => Promise<ProofState>): Promise<void> {
		this.problem = '';
		this.busy = true;
		try {
			this.state = await question();
		} catch (cause) {
			this.problem = cause instanceof Error ? cause.message : String(cause);
		} finally {
			this.busy = false;
			this.follow();
		}
	}
}
