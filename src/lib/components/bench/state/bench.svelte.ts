/** Everything behind one bench page, tied together. */
import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import type { AttemptView } from '$lib/schemas/attempt';
import type { BenchRequest } from '$lib/schemas/reading';
import type { LoggedSetUp } from '$lib/schemas/set-up-log';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { levelAt } from '../plot/plot-frame';
import { Playback } from '../over-time/playback.svelte';
import type { View } from '../over-time/ViewSwitch.svelte';
import type { ReadingContext } from '../readings/reading-kinds';
import type { ReadingRow } from '../readings/reading-row';
import { inDbm, type LevelScale } from '../levels/level-scale';
import { AnswerSheet } from './answer-sheet.svelte';
import { overloadRemedy, type Remedy } from './overload-remedy';
import { Refusal, type BenchWire } from './bench-wire';
import type { Markings } from '$lib/schemas/markings';
import { MarkingsKeeper } from './markings-keeper.svelte';
import { MarkerList } from './marker-list.svelte';
import { addMarker, followPeak, keepFollowing, spokenMarker, toPeak, type PeakStep } from './move-markers';
import { ReadingList } from './reading-list.svelte';
import { refusedSetUp, SetupSheet } from './setup-sheet.svelte';
import { readingContext, startReading } from './start-reading';
import { SweepRun } from './sweep-run.svelte';
import { TraceSet, type KeptRow } from './trace-set.svelte';

/** Points of earlier set-ups fetched at once to be played back, and sweeps at most. */
const fetchedPoints = 4_000_000;
const mostFetched = 1000;

/** The ends of an axis: Hz, or s in span 0, where the centre is the one frequency there is. */
export interface BenchAxis {
	kind: 'frequency' | 'time';
	start: number;
	stop: number;
	centreHz: number;
}

export class Bench {
	readonly traces = new TraceSet();
	readonly markers = new MarkerList();
	readonly playback = new Playback();
	/** How the sweeps are looked at. */
	view = $state<View>('spectrum');
	readonly run: SweepRun;
	readonly sheet: SetupSheet;
	readonly readings: ReadingList;
	readonly answers: AnswerSheet;
	readonly attempt: AttemptView;
	hints = $state.raw<readonly string[]>([]);
	/** The unit that levels are shown in. */
	levels = $state.raw<LevelScale>(inDbm);
	/** A run takes its sweeps once and stops. */
	once = $state(false);
	/** What was just done on the person's behalf, in words. */
	notice = $state<string | undefined>();
	/** What the live region says; `count` makes the same words count as said again. */
	said = $state.raw<{ words: string; count: number } | undefined>();
	readonly keeper: MarkingsKeeper;
	readonly wire: BenchWire;

	constructor(attempt: AttemptView, wire: BenchWire) {
		this.attempt = attempt;
		this.wire = wire;
		this.run = new SweepRun(attempt.bench, this.traces, wire);
		this.sheet = new SetupSheet(this.run);
		this.readings = new ReadingList({
			wire,
			run: this.run,
			traces: this.traces,
			markers: this.markers,
			taken: attempt.readings
		});
		this.answers = new AnswerSheet(attempt.exercise.questions, attempt.drafts, wire);
		this.hints = attempt.hints.revealed;
		if (attempt.markings) {
			const { levelUnit, antenna } = attempt.markings;
			this.markers.restore(attempt.markings);
			this.readings.restore(attempt.markings.readings);
			this.levels = { unit: levelUnit, antenna };
		}
		this.keeper = new MarkingsKeeper(this.markings, wire);
	}

	/** What lies on the bench besides its set-up and its evidence. */
	get markings(): Markings {
		return {
			// Where one that follows stands is found again from the trace.
			markers: this.markers.list.map((marker) => (marker.follows ? { ...marker, at: 0 } : marker)),
			selected: this.markers.selected?.letter ?? null,
			readings: this.readings.following.map(({ request, trace, values }) => ({ request, trace, values })),
			levelUnit: this.levels.unit,
			antenna: this.levels.antenna
		};
	}

	/** The ends of the axis: Hz, or s in span 0. */
	get axis(): BenchAxis {
		return this.axisOf(this.run.resolved);
	}

	axisOf({ startHz, stopHz, centreHz, spanHz, sweepTimeS }: ResolvedSettings): BenchAxis {
		return spanHz > 0
			? { kind: 'frequency', start: startHz, stop: stopHz, centreHz }
			: { kind: 'time', start: 0, stop: sweepTimeS, centreHz };
	}

	/** Shows what was drawn before and goes on sweeping, unless something stands in the way. */
	async open(): Promise<void> {
		await this.run.resume(this.attempt.bench);
		if (!this.attempt.bench.protectionTripped) await this.start();
	}

	close(): void {
		this.playback.close();
		this.answers.flush();
		this.keeper.flush();
		this.run.stop();
	}

	/**
	 * The level a trace shows at a place on the axis; undefined while it holds nothing there. As calm as the figures are:
	 * flags stand where the readings were taken, and don't move with every sweep.
	 */
	levelAt(at: number, trace: number): number | undefined {
		const drawn = this.traces.read[trace - 1]?.drawnDbm;
		return drawn && levelAt(drawn, this.axis, at);
	}

	/** One point of the trace, in the axis' unit. */
	get pointStep(): number {
		const { start, stop } = this.axis;
		return (stop - start) / (this.run.resolved.points - 1);
	}

	toPeak(letter: string, step: PeakStep): void {
		toPeak(this, letter, step);
	}

	/** The attempt has been handed in, on this page or another one. */
	get closed(): boolean {
		return this.run.closed || this.answers.closed;
	}

	addMarker(at?: number): void {
		addMarker(this, at);
	}

	followPeak(): void {
		followPeak(this);
	}

	keepFollowing(): void {
		keepFollowing(this);
	}

	moveMarker(letter: string, at: number): void {
		const { start, stop } = this.axis;
		this.markers.move(letter, Math.min(stop, Math.max(start, at)));
	}

	/** What a reading's form starts from. */
	get readingContext(): ReadingContext {
		return readingContext(this);
	}

	startReading(request: BenchRequest, values: Record<string, number>): Promise<void> {
		return startReading(this, request, values);
	}

	/** Puts other values into a reading that follows the traces. */
	changeReading(id: number, request: BenchRequest, values: Record<string, number>): void {
		if (request.kind !== 'count') this.readings.change(id, request, values);
	}

	readonly mostFetched = mostFetched;

	/** Plays back the sweeps of the set-up in force, as they are kept here. The receiver rests meanwhile. */
	playBackKept(): void {
		this.run.stop();
		const rows = this.traces.rows.slice();
		if (rows.length > 0) this.playback.open({ resolved: this.run.resolved, rows, words: 'this set-up' });
	}

	/** Set-ups before the one in force of which something was drawn, oldest first. */
	async earlierSetUps(): Promise<LoggedSetUp[]> {
		const all = (await this.wire.setUps?.()) ?? [];
		return all.filter(({ rows }) => rows !== null && rows.to < this.traces.restartRow);
	}

	/** Fetches the last sweeps of an earlier set-up and plays them back. */
	async playBack({ rows: drawn, resolved, number }: LoggedSetUp): Promise<void> {
		if (!drawn) return;
		const most = Math.min(mostFetched, Math.floor(fetchedPoints / resolved.points));
		const rows: KeptRow[] = [];
		for await (const frames of await this.wire.rows(Math.max(drawn.from, drawn.to - most + 1), drawn.to)) {
			for (const frame of frames) if (frame.type === 'piece' && frame.last) rows.push(frame);
		}
		this.run.stop();
		if (rows.length > 0) this.playback.open({ resolved, rows, words: `set-up ${number + 1}` });
	}

	/**
	 * Puts a set-up from elsewhere in force, whole. What was kept of a trace isn't in it, so such a trace is live again.
	 * @returns why the receiver refuses it, naming the fields; undefined when it is in force
	 */
	async recall(settings: Settings): Promise<string | undefined> {
		this.playback.close();
		const traces = settings.traces?.map((trace) =>
			trace.mode === 'kept' ? { mode: 'live' as const } : trace
		);
		try {
			await this.run.change({ ...settings, ...(traces && { traces }) });
			return undefined;
		} catch (error) {
			if (!(error instanceof Refusal)) throw error;
			return refusedSetUp(error);
		}
	}

	toggle(): void {
		if (this.run.running) this.run.stop();
		else void this.start();
	}

	/** How many sweeps a run takes: no end, or once the sweeps of the longest average. */
	get #sweeps(): number | undefined {
		if (!this.once) return undefined;
		return Math.max(
			1,
			...this.run.resolved.traces.map(({ mode, count }) => (mode === 'average' ? count : 1))
		);
	}

	/** Sweeps on, with the input protection reset if asked; a refusal is told at the field it belongs to. */
	async start(resetProtection?: boolean): Promise<void> {
		this.playback.close();
		try {
			await this.run.start(this.#sweeps, resetProtection);
		} catch (error) {
			this.run.stop();
			if (!(error instanceof Refusal)) throw error;
			this.notice = error.message;
		}
	}

	/** Lets the selected marker be read out. */
	say(): void {
		const row = this.readings.markerRows.find(({ letter }) => letter === this.markers.selectedLetter);
		if (row) this.said = { words: spokenMarker(this, row), count: (this.said?.count ?? 0) + 1 };
	}

	/** A place on the axis in words: a frequency, or a time in span 0. */
	writePlace(at: number): string {
		return this.axis.kind === 'time' ? formatTime(at) : formatFrequency(at);
	}

	/** What takes 10 dB off an overloaded mixer: the attenuator, then pads; undefined when all are in. */
	get overloadRemedy(): Remedy | undefined {
		return overloadRemedy(this.run.resolved, this.attempt.exercise.receiver);
	}

	/** Takes a row's reading as evidence and rests an answer on it. @throws Refusal with the reason */
	async attach(row: ReadingRow, questionId: string): Promise<void> {
		const id = row.takenId ?? (await this.readings.take(row)).id;
		this.answers.attach(questionId, id);
	}

	/**
	 * Hands the answers in, with the receiver at rest, so that everything drawn is told first. A refusal sets it going again.
	 * @returns true when they were taken
	 */
	async handIn(): Promise<boolean> {
		const running = this.run.running;
		this.run.stop();
		await this.run.settleAcknowledgement().catch(() => undefined);
		const taken = await this.answers.handIn();
		if (this.answers.closed) this.run.closed = true;
		else if (running) await this.start();
		return taken;
	}

	/** Ends the attempt without answers. @throws Refusal when it has been closed already */
	async abandon(): Promise<void> {
		this.run.stop();
		await this.run.settleAcknowledgement().catch(() => undefined);
		await this.wire.abandon?.();
		this.run.closed = true;
		this.answers.closed = true;
	}

	async nextHint(): Promise<void> {
		const { hint } = await this.wire.nextHint();
		this.hints = [...this.hints, hint];
	}
}
