/**
 * The traces on show: rows as they come from the receiver, held and averaged as each trace asks.
 * Samples never become reactive; only the list of finished traces is replaced, once a frame.
 */
import { averageOfScaled, combineRows, scaledRow } from '$lib/measure/combine-rows';
import type { PieceFrame } from '$lib/schemas/frames';
import type { ResolvedSettings } from '$lib/schemas/settings';

type TraceSetUp = ResolvedSettings['traces'][number];

export interface ShownTrace extends TraceSetUp {
	/** The rows it holds, first and last. */
	rows: { from: number; to: number };
	/** Whole rows only: what readings are taken from. Empty before the first. */
	levelsDbm: ArrayLike<number>;
	/** What is drawn: for a live trace the sweep in progress over the one before. */
	drawnDbm: ArrayLike<number>;
}

/** A whole sweep as it came. */
export interface KeptRow {
	row: number;
	/** Bench clock when it ended, s. */
	clockS: number;
	levelsDbm: Float32Array;
}

/**
 * Points kept since the restart (48 MB), so that a trace turned to hold or average starts from all its rows, and so that
 * they can be played back.
 */
const keptPoints = 12_000_000;

/** Sweeps of so many points that are kept at most. */
export const mostRows = (points: number): number => Math.max(2, Math.floor(keptPoints / points));

/** Figures change at most this often, ms. */
const readEveryMs = 200;

export class TraceSet {
	shown = $state.raw<readonly ShownTrace[]>([]);
	/** What readings are taken from: the traces as they stood a moment ago at most, so that figures can be read. */
	read = $state.raw<readonly ShownTrace[]>([]);
	/** Last whole row in the traces; undefined before the first. */
	lastRow = $state<number | undefined>();
	/** Last whole row in `read`. */
	readRow = $state<number | undefined>();
	/** Where holds and averages start. */
	restartRow = $state(0);
	/** Share of the sweep in progress that has come, 0 to 1; undefined between sweeps. */
	progress = $state<number | undefined>();
	readonly rowCount = $derived(this.#countTo(this.lastRow));
	/** Rows since the restart in `read`. */
	readonly readCount = $derived(this.#countTo(this.readRow));

	#setUps: readonly TraceSetUp[] = [];
	#scale: ResolvedSettings['scale'] = 'log';
	#rows: KeptRow[] = [];
	#readAtMs = -Infinity;
	#piece: Float32Array | undefined;
	#sweptPoints = 0;
	#held: Partial<Record<TraceSetUp['mode'], ArrayLike<number>>> = {};
	/** Rows on the scale that averages are made on. */
	#onScale = new WeakMap<Float32Array, Float64Array>();
	/** Traces kept as they were, by position. */
	#kept: (ShownTrace | undefined)[] = [];

	/** Every whole sweep kept since the restart, oldest first. Not reactive: read `lastRow` to hear of more. */
	get rows(): readonly KeptRow[] {
		return this.#rows;
	}

	/** Forgets every row: the set-up changed. */
	restart(restartRow: number): void {
		this.restartRow = restartRow;
		this.#rows = [];
		this.#held = {};
		this.#piece = undefined;
	}

	/** Takes the traces of a set-up; rows since the restart stay. */
	use(resolved: ResolvedSettings): void {
		resolved.traces.forEach(({ mode }, i) => {
			const before = this.shown[i];
			if (mode !== 'kept') this.#kept[i] = undefined;
			else if (before && !this.#kept[i]) this.#kept[i] = { ...before, mode };
		});
		this.#setUps = resolved.traces;
		if (this.#scale !== resolved.scale) {
			this.#held = {};
			this.#onScale = new WeakMap();
		}
		this.#scale = resolved.scale;
	}

	/** Adds one piece of a row. @returns the row's number when it is whole now */
	take(piece: PieceFrame): number | undefined {
		if (this.#piece?.length !== piece.points) this.#piece = new Float32Array(piece.points).fill(NaN);
		this.#piece.set(piece.levelsDbm, piece.fromPoint);
		this.#sweptPoints = piece.fromPoint + piece.levelsDbm.length;
		if (!piece.last) return undefined;
		this.#add({ row: piece.row, clockS: piece.clockS, levelsDbm: this.#piece });
		this.#piece = undefined;
		return piece.row;
	}

	/** Makes the finished traces anew: once a frame, after everything that came with it was taken. */
	show(): void {
		this.lastRow = this.#rows.at(-1)?.row;
		this.progress = this.#piece && this.#sweptPoints / this.#piece.length;
		this.shown = this.#setUps.map((setUp, i) => this.#kept[i] ?? this.#finished(setUp));
		if (this.rowCount <= 1 || performance.now() - this.#readAtMs >= readEveryMs) this.settle();
	}

	/** Lets readings see the traces as they stand now. */
	settle(): void {
		this.read = this.shown;
		this.readRow = this.lastRow;
		this.#readAtMs = performance.now();
	}

	#countTo(row: number | undefined): number {
		return row === undefined ? 0 : row - this.restartRow + 1;
	}

	#add(kept: KeptRow): void {
		const { levelsDbm } = kept;
		this.#rows.push(kept);
		for (const mode of ['max-hold', 'min-hold'] as const) {
			const held = this.#held[mode];
			if (held) this.#held[mode] = combineRows([held, levelsDbm], mode, 2, this.#scale);
		}
		const most = mostRows(levelsDbm.length);
		if (this.#rows.length > most) this.#rows.splice(0, this.#rows.length - most);
	}

	#finished(setUp: TraceSetUp): ShownTrace {
		const last = this.#rows.at(-1);
		if (!last) {
			const drawnDbm = setUp.mode === 'live' ? this.#overdrawn([]) : [];
			return { ...setUp, rows: { from: this.restartRow, to: this.restartRow }, levelsDbm: [], drawnDbm };
		}
		const to = last.row;
		if (setUp.mode === 'max-hold' || setUp.mode === 'min-hold') {
			const levelsDbm = this.#hold(setUp.mode);
			return { ...setUp, rows: { from: this.restartRow, to }, levelsDbm, drawnDbm: levelsDbm };
		}
		if (setUp.mode === 'average') {
			const covered = this.#rows.slice(-setUp.count);
			const levelsDbm = averageOfScaled(
				covered.map((kept) => this.#scaled(kept)),
				this.#scale
			);
			return { ...setUp, rows: { from: covered[0].row, to }, levelsDbm, drawnDbm: levelsDbm };
		}
		return {
			...setUp,
			rows: { from: to, to },
			levelsDbm: last.levelsDbm,
			drawnDbm: this.#overdrawn(last.levelsDbm)
		};
	}

	/** Raising to powers of ten is most of the work of an average, so each row is put on the scale once. */
	#scaled({ levelsDbm }: KeptRow): Float64Array {
		const known = this.#onScale.get(levelsDbm);
		if (known) return known;
		const made = scaledRow(levelsDbm, this.#scale);
		this.#onScale.set(levelsDbm, made);
		return made;
	}

	#hold(mode: 'max-hold' | 'min-hold'): ArrayLike<number> {
		const held = this.#held[mode] ?? combineRows(levelsOf(this.#rows), mode, this.#rows.length, this.#scale);
		this.#held[mode] = held;
		return held;
	}

	/** The sweep in progress over what stood there before. */
	#overdrawn(before: ArrayLike<number>): ArrayLike<number> {
		return this.#piece?.map((level, i) => (Number.isNaN(level) ? (before[i] ?? NaN) : level)) ?? before;
	}
}

const levelsOf = (rows: readonly { levelsDbm: Float32Array }[]) => rows.map(({ levelsDbm }) => levelsDbm);
