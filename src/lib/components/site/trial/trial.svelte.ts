/** The front page's bench: one signal, a choice of resolutions, two markers, one answer. */
import { isProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { TrialAnswerRequest, TrialFinding, TrialSweep, TrialView } from '$lib/schemas/trial';
import { showFrequency } from '$lib/units/format-quantity';

/** What the page asks of the server; it rejects with an Error whose message may be shown. */
export interface TrialWire {
	start(): Promise<TrialView>;
	sweep(token: string, choice: number, row: number): Promise<TrialSweep>;
	answer(request: TrialAnswerRequest): Promise<TrialFinding>;
}

export type TrialMarker = 'A' | 'B';
/** The receiver rests when nobody has touched anything for as long as this, ms. */
const restAfterMs = 45_000;

export class Trial {
	view = $state.raw<TrialView>() as TrialView;
	sweep = $state.raw<TrialSweep>() as TrialSweep;
	/** The last sweep through the resolution looked through before this one. */
	before = $state.raw<TrialSweep | undefined>();
	at = $state<Record<TrialMarker, number>>({ A: 0, B: 0 });
	selected = $state<TrialMarker>('A');
	text = $state('');
	unit = $state('');
	finding = $state.raw<TrialFinding | undefined>();
	problem = $state<string | undefined>();
	busy = $state(false);

	readonly #wire: TrialWire;
	#looks: { choice: number; sweeps: number }[] = [];
	#rows = 1;
	#touchedAtMs = -Infinity;
	#turn: Promise<void> = Promise.resolve();
	#waiting = 0;

	constructor(view: TrialView, wire: TrialWire) {
		this.#wire = wire;
		this.#take(view);
	}

	#take(view: TrialView): void {
		const { first, startHz, stopHz, units } = view;
		const spanHz = stopHz - startHz;
		this.view = view;
		this.sweep = first;
		this.before = undefined;
		this.at = { A: startHz + 0.3 * spanHz, B: startHz + 0.7 * spanHz };
		this.selected = 'A';
		this.text = '';
		const readable = showFrequency(spanHz).unit;
		this.unit = units.includes(readable) ? readable : view.unit;
		this.finding = undefined;
		this.problem = undefined;
		this.#looks = [{ choice: first.choice, sweeps: 1 }];
		this.#rows = first.row + 1;
	}

	get pointHz(): number {
		return (this.view.stopHz - this.view.startHz) / (this.sweep.levelsDbm.length - 1);
	}

	levelAt(atHz: number): number {
		return this.sweep.levelsDbm[Math.round((atHz - this.view.startHz) / this.pointHz)];
	}

	/** Whether the receiver should be sweeping now. */
	awake(nowMs: number): boolean {
		return !this.finding && !this.busy && nowMs - this.#touchedAtMs < restAfterMs;
	}

	touch(): void {
		this.#touchedAtMs = performance.now();
	}

	/** Puts a marker on the nearest point of the trace. */
	move(marker: TrialMarker, atHz: number): void {
		this.touch();
		const { startHz, stopHz } = this.view;
		const point = Math.round((Math.min(stopHz, Math.max(startHz, atHz)) - startHz) / this.pointHz);
		this.at = { ...this.at, [marker]: startHz + point * this.pointHz };
	}

	/** To the next peak on one side, if there is one. */
	toPeak(marker: TrialMarker, side: 'lower' | 'upper'): void {
		const { startHz, stopHz } = this.view;
		const rbwHz = this.view.resolutionsHz[this.sweep.choice];
		const { levelsDbm } = this.sweep;
		const setUp = { detector: 'rise-fall', scale: 'log', mode: 'live', count: 1 } as const;
		const trace = { ...setUp, startHz, stopHz, rbwHz, levelsDbm };
		const outcome = takeReading(trace, { kind: 'next-peak', fromHz: this.at[marker], side });
		if (isProblem(outcome)) return;
		const { frequencyHz } = outcome.parts as { frequencyHz: number };
		this.move(marker, frequencyHz);
	}

	/** Looks through another resolution. */
	async look(choice: number): Promise<void> {
		this.touch();
		await this.#ask(async () => {
			if (choice === this.sweep.choice) return;
			const next = await this.#wire.sweep(this.view.token, choice, this.#rows);
			this.before = this.sweep;
			this.#looks.push({ choice, sweeps: 1 });
			this.#show(next);
		});
	}

	/** One more sweep through the same resolution. */
	async again(): Promise<void> {
		const { choice } = this.sweep;
		const next = await this.#wire.sweep(this.view.token, choice, this.#rows);
		if (this.sweep.choice !== choice || this.finding) return;
		this.#looks[this.#looks.length - 1].sweeps += 1;
		this.#show(next);
	}

	async handIn(): Promise<void> {
		const { text, unit, at, view, sweep } = this;
		if (text.trim() === '') {
			this.problem = 'Give the number you read, with its unit.';
			return;
		}
		const looks = this.#looks.slice(-100);
		const request = { token: view.token, text, unit, looks, row: sweep.row, fromHz: at.A, toHz: at.B };
		await this.#ask(async () => {
			this.finding = await this.#wire.answer(request);
		});
	}

	async another(): Promise<void> {
		await this.#ask(async () => this.#take(await this.#wire.start()));
		this.touch();
	}

	#show(sweep: TrialSweep): void {
		this.sweep = sweep;
		this.#rows = sweep.row + 1;
	}

	/** One thing after another, so that a choice made while a new signal is on its way is made on that one. */
	#ask(work: () => Promise<void>): Promise<void> {
		this.busy = true;
		this.problem = undefined;
		this.#waiting += 1;
		this.#turn = this.#turn
			.then(work)
			.catch((error: unknown) => {
				this.problem = error instanceof Error ? error.message : String(error);
			})
			.finally(() => {
				this.#waiting -= 1;
				this.busy = this.#waiting > 0;
			});
		return this.#turn;
	}
}
