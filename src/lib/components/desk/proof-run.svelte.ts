/** The proof of an exercise as its desk follows it. */
import type { ProofState } from '$lib/schemas/proof-view';
import type { DeskWire } from './desk-wire';

const LOOK_EVERY_MS = 700;

export class ProofRun {
	state = $state.raw<ProofState>() as ProofState;
	problem = $state('');
	busy = $state(false);
	#timer: ReturnType<typeof setTimeout> | undefined;
	#turns = 0;

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
	start = (): Promise<void> => this.#act(() => this.wire.askForProof());
	cancel = (): Promise<void> => this.#act(() => this.wire.cancelProof());

	/** Only what was pressed holds the buttons: looking on must not take them away under a finger. */
	async #act(question: () => Promise<ProofState>): Promise<void> {
		this.busy = true;
		await this.#ask(question);
		this.busy = false;
	}

	/** Of several questions under way, the last one's answer counts. */
	async #ask(question: () => Promise<ProofState>): Promise<void> {
		clearTimeout(this.#timer);
		const turn = ++this.#turns;
		try {
			const state = await question();
			if (turn !== this.#turns) return;
			this.state = state;
			this.problem = '';
		} catch (cause) {
			if (turn !== this.#turns) return;
			this.problem = cause instanceof Error ? cause.message : String(cause);
		}
		this.follow();
	}
}
