/** One file of a draft as it is typed: kept by itself a moment after the last key, with who else is at it. */
import type { DraftFileView, FileVersionText, PresenceView } from '$lib/schemas/desk';
import { SaveConflict, type DeskWire } from './desk-wire';

/** Silence after which what was typed is kept, ms. */
const KEEP_AFTER_MS = 900;

export class FileEditor {
	text = $state('');
	/** What the server holds under `revision`. */
	kept = $state.raw<DraftFileView>() as DraftFileView;
	keeping = $state(false);
	problem = $state('');
	/** Somebody else's text that stands where this one would go. */
	theirs = $state.raw<DraftFileView | null>(null);
	/** What was typed here before theirs was taken. */
	mine = $state.raw<string | null>(null);
	others = $state.raw<PresenceView['others']>([]);
	#timer: ReturnType<typeof setTimeout> | undefined;
	#turn: Promise<void> = Promise.resolve();

	constructor(
		file: DraftFileView,
		private readonly wire: DeskWire,
		/** Called with each text that has been kept, or brought in from outside. */
		private readonly onKept: (text: string) => void
	) {
		this.kept = file;
		this.text = file.text;
	}

	get changed(): boolean {
		return this.text !== this.kept.text;
	}

	/** After each key. */
	type(text: string): void {
		this.text = text;
		clearTimeout(this.#timer);
		this.#timer = setTimeout(() => void this.keep(), KEEP_AFTER_MS);
	}

	/** Keeps what is typed now; one after the other, so that a save never meets one of its own. */
	keep(): Promise<void> {
		clearTimeout(this.#timer);
		this.#turn = this.#turn.then(() => this.#keep());
		return this.#turn;
	}

	async #keep(): Promise<void> {
		if (!this.changed || this.theirs) return;
		const { text } = this;
		await this.#save(text, this.kept.revision);
	}

	async #save(text: string, revision: number): Promise<void> {
		this.keeping = true;
		this.problem = '';
		try {
			const saved = await this.wire.save(text, revision);
			this.kept = { ...this.kept, ...saved, text };
			this.theirs = null;
			this.onKept(text);
		} catch (cause) {
			if (cause instanceof SaveConflict) this.theirs = cause.theirs;
			else this.problem = cause instanceof Error ? cause.message : String(cause);
		} finally {
			this.keeping = false;
		}
	}

	/** Mine over theirs, which stays in the history. */
	async keepMine(): Promise<void> {
		if (this.theirs) await this.#save(this.text, this.theirs.revision);
	}

	/** Theirs in place of mine, which can be brought back while this page is open. */
	takeTheirs(): void {
		if (!this.theirs) return;
		this.mine = this.text;
		this.#take(this.theirs);
	}

	bringMineBack(): void {
		if (this.mine === null) return;
		this.type(this.mine);
		this.mine = null;
	}

	#take(file: DraftFileView): void {
		this.kept = file;
		this.text = file.text;
		this.theirs = null;
		this.problem = '';
		this.onKept(file.text);
	}

	async restore(version: FileVersionText): Promise<void> {
		await this.keep();
		if (this.theirs) return;
		try {
			const saved = await this.wire.restore(version.id, this.kept.revision);
			this.#take({ ...this.kept, ...saved, text: version.text });
		} catch (cause) {
			if (cause instanceof SaveConflict) this.theirs = cause.theirs;
			else this.problem = cause instanceof Error ? cause.message : String(cause);
		}
	}

	/** Says that the file is open here, and hears who else has it. */
	async lookAround(): Promise<void> {
		try {
			this.others = (await this.wire.presence()).others;
		} catch {
			// Only told from time to time; whatever is wrong shows when something is to be kept.
			this.others = [];
		}
	}
}
