/** The readings on the bench: those that follow the traces, and those the server has taken as evidence. */
import type { Reading, ReadingProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';
import type { ReadingView } from '$lib/schemas/attempt';
import type { Markings } from '$lib/schemas/markings';
import type { CountRequest, ReadingRequest } from '$lib/schemas/reading';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { readingPlace, readingWords, sourceWords, takenFromWords } from '../readings/reading-words';
import type { ReadingRow } from '../readings/reading-row';
import { Refusal, type BenchWire } from './bench-wire';
import type { Marker, MarkerList } from './marker-list.svelte';
import type { SweepRun } from './sweep-run.svelte';
import type { ShownTrace, TraceSet } from './trace-set.svelte';

interface RefusedCount {
	id: number;
	request: CountRequest;
	/** The marker it was asked at. */
	letter?: string;
	message: string;
}

interface Following {
	id: number;
	request: ReadingRequest;
	trace: number;
	/** Kind and values as the form had them, to open it again. */
	values: Record<string, number>;
}

export class ReadingList {
	/** Readings that are taken anew from every sweep. */
	following = $state.raw<readonly Following[]>([]);
	taken = $state.raw<readonly ReadingView[]>([]);
	/** Counts that found nothing to count, until they are put away. */
	refused = $state.raw<readonly RefusedCount[]>([]);
	readonly #wire: BenchWire;
	readonly #run: SweepRun;
	readonly #traces: TraceSet;
	readonly #markers: MarkerList;
	#nextId = 1;

	readonly markerRows = $derived.by(() => this.#markers.list.map((marker) => this.#markerRow(marker)));
	readonly followingRows = $derived.by(() => this.following.map((entry) => this.#followingRow(entry)));
	readonly takenRows = $derived.by(() => this.taken.map(takenRow));
	readonly refusedRows = $derived(this.refused.map(refusedRow));
	readonly rows = $derived([
		...this.followingRows,
		...this.markerRows,
		...this.refusedRows,
		...this.takenRows
	]);

	constructor(parts: {
		wire: BenchWire;
		run: SweepRun;
		traces: TraceSet;
		markers: MarkerList;
		taken: ReadingView[];
	}) {
		this.#wire = parts.wire;
		this.#run = parts.run;
		this.#traces = parts.traces;
		this.#markers = parts.markers;
		this.taken = parts.taken;
	}

	follow(request: ReadingRequest, values: Record<string, number>, trace = 1): void {
		this.following = [...this.following, { id: this.#nextId++, request, trace, values }];
	}

	/** Puts readings that follow the traces back as they were. */
	restore(readings: Markings['readings']): void {
		this.following = readings.map((entry) => ({ id: this.#nextId++, ...entry }));
	}

	change(id: number, request: ReadingRequest, values: Record<string, number>): void {
		this.following = this.following.map((entry) => (entry.id === id ? { ...entry, request, values } : entry));
	}

	remove(id: number): void {
		this.following = this.following.filter((entry) => entry.id !== id);
	}

	/**
	 * Has the server take a row's reading from the same sweeps: what comes back is evidence.
	 * @throws Refusal with the reason why the sweeps don't support it
	 */
	async take({ trace: number = 1, request }: ReadingRow): Promise<ReadingView> {
		const trace = this.#traces.read[number - 1];
		await this.#run.settleAcknowledgement(trace.rows.to);
		const reading = await this.#wire.takeReading({ rows: trace.rows, trace: number, request });
		this.taken = [...this.taken, reading];
		return reading;
	}

	/** Counts on the bench, between two sweeps. What can't be counted stays in the list with the reason. */
	async count(request: CountRequest, letter?: string): Promise<void> {
		this.refused = this.refused.filter((before) => before.request.atHz !== request.atHz);
		try {
			const reading = await this.#run.between(() => this.#wire.takeReading({ request }));
			this.taken = [...this.taken, reading];
		} catch (error) {
			if (!(error instanceof Refusal)) throw error;
			this.refused = [...this.refused, { id: this.#nextId++, request, letter, message: error.message }];
		}
	}

	putAway(id: number): void {
		this.refused = this.refused.filter((count) => count.id !== id);
	}

	/** A trace as `measure` takes it; undefined while it holds nothing. */
	traceOf(number: number): Trace | undefined {
		const shown = this.#traces.read[number - 1];
		return shown && shown.levelsDbm.length > 1 ? measurable(shown, this.#run.resolved) : undefined;
	}

	#read(request: ReadingRequest, trace: number): Reading | ReadingProblem | undefined {
		const measured = this.traceOf(trace);
		return measured && takeReading(measured, request);
	}

	#takenFrom(number: number): string {
		const shown = this.#traces.read[number - 1];
		return shown && shown.levelsDbm.length > 0
			? takenFromWords({ from: shown.rows.to, to: shown.rows.to }, number)
			: '';
	}

	#followingRow({ id, request, trace }: Following): ReadingRow {
		return {
			key: `following-${id}`,
			request,
			trace,
			words: readingWords(request),
			atHz: readingPlace(request),
			outcome: this.#read(request, trace),
			takenFrom: this.#takenFrom(trace)
		};
	}

	#markerRow(marker: Marker): ReadingRow {
		const other = this.#markers.find(marker.from);
		const request = markerRequest(marker, other, this.#run.resolved.spanHz === 0);
		const common = {
			key: `marker-${marker.letter}`,
			letter: marker.letter,
			request,
			trace: marker.trace,
			outcome: this.#read(request, marker.trace),
			takenFrom: this.#takenFrom(marker.trace)
		};
		if (other)
			return { ...common, words: `Marker, from ${other.letter}`, atHz: marker.at - other.at, relative: true };
		return { ...common, words: marker.follows ? 'Highest point' : 'Marker', atHz: marker.at };
	}
}

/** The request a marker stands for: its own level, the highest point it keeps to, or its distance from another. */
function markerRequest(marker: Marker, other: Marker | undefined, overTime: boolean): ReadingRequest {
	if (other) {
		return overTime
			? { kind: 'delta', fromS: other.at, toS: marker.at }
			: { kind: 'delta', fromHz: other.at, toHz: marker.at };
	}
	if (marker.follows) return { kind: 'peak' };
	return overTime ? { kind: 'marker', atS: marker.at } : { kind: 'marker', atHz: marker.at };
}

function measurable(shown: ShownTrace, resolved: ResolvedSettings): Trace {
	const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
	return {
		...{ startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb },
		mode: shown.mode,
		count: shown.rows.to - shown.rows.from + 1,
		levelsDbm: shown.levelsDbm
	};
}

function takenRow(reading: ReadingView): ReadingRow {
	const { id, request, trace, value, unit, spread, remarks } = reading;
	const delta = request.kind === 'delta' && request.fromHz !== undefined && request.toHz !== undefined;
	return {
		key: `taken-${id}`,
		takenId: id,
		request,
		trace: trace ?? undefined,
		words: readingWords(request),
		atHz: delta ? request.toHz! - request.fromHz! : readingPlace(request),
		relative: delta,
		outcome: { value, unit, spread, remarks } as ReadingRow['outcome'],
		takenFrom: sourceWords(reading)
	};
}

const refusedRow = ({ id, request, letter, message }: RefusedCount): ReadingRow => ({
	key: `refused-${id}`,
	refusedId: id,
	letter,
	request,
	words: readingWords(request),
	outcome: { problem: message, needs: '' },
	takenFrom: ''
});
