/** A live figure as its reader turns it: what is shown, what was shown before, and what has been asked for. */
import type { FigureChoice } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';

/** Has the figure made at other choices. A failure's message is fit to be shown. */
export type AskFigure = (figureId: string, values: readonly FigureChoice[]) => Promise<FigureState>;

/** Earlier states that stay on the drawing for comparison. */
const MOST_EARLIER = 2;

export class FigureRun {
	/** Where the controls stand; the drawing follows as soon as it has been made. */
	wanted: readonly FigureChoice[] = $state.raw([]);
	shown: FigureState;
	/** The last first. */
	earlier: readonly FigureState[] = $state.raw([]);
	refusal = $state('');
	#turns = 0;
	readonly #made: Record<string, FigureState> = {};

	constructor(
		readonly id: string,
		start: FigureState,
		private readonly ask: AskFigure
	) {
		this.shown = $state.raw(start);
		this.wanted = start.values;
		this.#made[keyOf(start.values)] = start;
	}

	get waiting(): boolean {
		return keyOf(this.wanted) !== keyOf(this.shown.values);
	}

	/** Turns one control. When several turns overtake each other, the last one counts. */
	async turn(control: number, choice: FigureChoice): Promise<void> {
		if (this.wanted[control] === choice) return;
		const values = this.wanted.map((value, i) => (i === control ? choice : value));
		this.wanted = values;
		this.refusal = '';
		const turn = ++this.#turns;
		try {
			const state = this.#made[keyOf(values)] ?? (await this.ask(this.id, values));
			this.#made[keyOf(values)] = state;
			if (turn === this.#turns) this.#show(state);
		} catch (cause) {
			if (turn !== this.#turns) return;
			this.wanted = this.shown.values;
			this.refusal = cause instanceof Error ? cause.message : String(cause);
		}
	}

	forgetEarlier(): void {
		this.earlier = [];
	}

	#show(state: FigureState): void {
		if (state === this.shown) return;
		this.earlier = [this.shown, ...this.earlier]
			.filter((other) => other !== state && other.traces.length > 0)
			.slice(0, MOST_EARLIER);
		this.shown = state;
	}
}

const keyOf = (values: readonly FigureChoice[]): string => JSON.stringify(values);
