/** Plays a method's steps: each is shown, its sweeps drawn one after another, and after a while the next one comes. */
import type { PlayedStepView } from '$lib/schemas/done-right';
import type { Frame } from '$lib/schemas/frames';
import { TraceReplay } from '../bench/over-time/trace-replay';
import type { KeptRow } from '../bench/state/trace-set.svelte';

export const speeds = [0.5, 1, 2, 4] as const;
export type Speed = (typeof speeds)[number];

/** How long the sweeps of a step take on the page at least and at most, s. */
const sweepingS = { least: 1, most: 6 };
/** How long a step stands before the next one comes: some time, and more the longer its words, s. */
const standsS = (step: PlayedStepView) => 2 + `${step.text} ${step.why ?? ''}`.length / 28;

export class DoneRightPlayer {
	readonly steps: readonly PlayedStepView[];
	/** The step on show, from 0. */
	at = $state(0);
	playing = $state(false);
	speed = $state<Speed>(1);
	/** Rows of the step on show, once they have come. */
	rows = $state.raw<readonly KeptRow[]>([]);
	/** The last of them that has been drawn. */
	drawn = $state(0);
	trouble = $state('');
	readonly step: PlayedStepView = $derived.by(() => this.steps[this.at]);
	readonly tracesDbm = $derived.by(() => {
		const { rows, step, drawn } = this;
		if (rows.length === 0) return [];
		const replay = new TraceReplay({ resolved: step.resolved, rows, words: '' });
		return replay.after(Math.min(drawn, rows.length - 1));
	});

	readonly #fetchRows: (step: number) => Promise<AsyncIterable<Frame[]>>;
	readonly #calm: () => boolean;
	// A memory of what was fetched; nothing on the page hangs on it.
	// eslint-disable-next-line svelte/prefer-svelte-reactivity
	readonly #fetched = new Map<string, Promise<readonly KeptRow[]>>();
	#frame: number | undefined;
	/** Real time that this step has been on show, times the speed, s. */
	#shownS = 0;

	/** @param calm whether nothing should move by itself: then a step's sweeps stand there at once */
	constructor(
		steps: readonly PlayedStepView[],
		fetchRows: (step: number) => Promise<AsyncIterable<Frame[]>>,
		calm: () => boolean
	) {
		this.steps = steps;
		this.#fetchRows = fetchRows;
		this.#calm = calm;
	}

	/** Shows a step; going on to one that sweeps draws its sweeps one after another. */
	async show(at: number): Promise<void> {
		const goesOn = at === this.at + 1;
		this.at = Math.min(this.steps.length - 1, Math.max(0, at));
		this.#shownS = 0;
		const wanted = this.at;
		this.trouble = '';
		try {
			const rows = await this.#rowsOf(wanted);
			if (wanted !== this.at) return;
			this.rows = rows;
			this.drawn = goesOn && this.#sweepS > 0 ? this.#firstFresh : rows.length - 1;
			this.#shownS = goesOn ? 0 : this.#sweepS;
			if (this.playing || goesOn) this.#run();
		} catch {
			this.pause();
			this.trouble = 'The sweeps could not be fetched. Step on or back to try again.';
		}
	}

	play(): void {
		this.playing = true;
		if (this.at >= this.steps.length - 1) void this.show(0);
		else this.#run();
	}

	pause(): void {
		this.playing = false;
		if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
		this.#frame = undefined;
		this.drawn = Math.max(0, this.rows.length - 1);
		this.#shownS = this.#sweepS;
	}

	/** Rows of this step that the step before didn't show: where its drawing begins. */
	get #firstFresh(): number {
		const { rows } = this.step;
		const before = this.steps[this.at - 1]?.rows;
		return rows && before && before.from === rows.from ? before.to - rows.from + 1 : 0;
	}

	/** How long the sweeps of this step take on the page, s. */
	get #sweepS(): number {
		const { step, rows } = this;
		const fresh = rows.length - this.#firstFresh;
		if (step.do !== 'sweep' || this.#calm() || fresh < 2) return 0;
		return Math.min(sweepingS.most, Math.max(sweepingS.least, fresh * step.resolved.sweepTimeS));
	}

	#run(): void {
		if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
		let beforeMs = performance.now();
		const tick = (nowMs: number) => {
			this.#shownS += (Math.max(0, nowMs - beforeMs) / 1000) * this.speed;
			beforeMs = nowMs;
			const sweepS = this.#sweepS;
			const first = this.#firstFresh;
			const share = sweepS > 0 ? Math.min(1, this.#shownS / sweepS) : 1;
			this.drawn = Math.max(0, first + Math.floor(share * (this.rows.length - 1 - first)));
			const over = this.#shownS >= sweepS + (this.playing ? standsS(this.step) : 0);
			if (!over) this.#frame = requestAnimationFrame(tick);
			else if (!this.playing) this.#frame = undefined;
			else if (this.at < this.steps.length - 1) void this.show(this.at + 1);
			else this.pause();
		};
		this.#frame = requestAnimationFrame(tick);
	}

	/** Steps with the same rows share them. */
	#rowsOf(at: number): Promise<readonly KeptRow[]> {
		const { rows } = this.steps[at];
		const key = rows ? `${rows.from} to ${rows.to}` : `before ${at}`;
		const known = this.#fetched.get(key);
		if (known) return known;
		const fetched = collected(this.#fetchRows(at));
		this.#fetched.set(key, fetched);
		fetched.catch(() => this.#fetched.delete(key));
		return fetched;
	}
}

async function collected(asked: Promise<AsyncIterable<Frame[]>>): Promise<KeptRow[]> {
	const rows: KeptRow[] = [];
	for await (const frames of await asked) {
		for (const frame of frames) if (frame.type === 'piece' && frame.last) rows.push(frame);
	}
	return rows;
}
