/** Asks the receiver for sweeps, takes what comes, and tells the server what was drawn. */
import type { BenchView } from '$lib/schemas/attempt';
import type { Frame } from '$lib/schemas/frames';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { streamEnd, streamState, type ReceiverFlag, type StreamEndReason } from '$lib/schemas/sweep-stream';
import { Refusal, type BenchWire } from './bench-wire';
import { Askings } from './askings';
import { DrawnRows } from './drawn-rows';
import type { TraceSet } from './trace-set.svelte';
import { nextPaint, pause } from './waits';
import { withProtection } from './with-protection';

/** Waits before asking again after a lost connection, ms. */
const retryAfterMs = [300, 1000, 2000, 4000, 8000];

export class SweepRun {
	/** Sweeps are wanted. */
	running = $state(false);
	/** The connection was lost and is being sought again. */
	lost = $state(false);
	/** Why the receiver stopped by itself. */
	ended = $state<{ reason: StreamEndReason | 'refused'; message: string } | undefined>();
	/** Number of the set-up in force in the attempt's log, from 0; null before the first sweep. */
	setUp = $state<number | null>(null);
	settings = $state.raw<Settings>({});
	resolved = $state.raw<ResolvedSettings>() as ResolvedSettings;
	flags = $state.raw<readonly ReceiverFlag[]>([]);
	benchTimeUsedS = $state(0);
	speedUp = $state(1);
	/** The attempt has been handed in, here or elsewhere: nothing more is swept or told. */
	closed = $state(false);
	/** A new set-up is on its way and nothing of it has come back yet. */
	settling = $state(false);

	readonly #wire: BenchWire;
	readonly #traces: TraceSet;
	#stream: AbortController | undefined;
	readonly #askings = new Askings();
	#nextRow: number;
	/** Sweeps of the run under way; without end when undefined. */
	#wanted: number | undefined;
	readonly #drawn: DrawnRows;
	#clock: { clockS: number; usedS: number };

	constructor(bench: BenchView, traces: TraceSet, wire: BenchWire) {
		this.#wire = wire;
		this.#traces = traces;
		this.#drawn = new DrawnRows((row) => (this.closed ? Promise.resolve() : wire.acknowledge(row)));
		this.settings = bench.settings;
		this.setUp = bench.setUp;
		this.resolved = bench.resolved;
		this.flags = bench.protectionTripped ? withProtection(bench.flags) : bench.flags;
		this.benchTimeUsedS = bench.benchTimeUsedS;
		this.#clock = { clockS: bench.clockS, usedS: bench.benchTimeUsedS };
		this.#nextRow = bench.resumeFrom;
		traces.restart(bench.restartRow);
		traces.use(bench.resolved);
	}

	/** Shows again what was drawn before the page was left. */
	async resume(bench: BenchView): Promise<void> {
		if (bench.drawnTo === null || bench.drawnTo < bench.restartRow) return;
		for await (const frames of await this.#wire.rows(bench.restartRow, bench.drawnTo)) {
			for (const frame of frames) if (frame.type === 'piece') this.#traces.take(frame);
		}
		this.#traces.show();
		this.#traces.settle();
	}

	/** Sweeps on with the set-up in force, `sweeps` times or until stopped. */
	start(sweeps?: number, resetProtection?: boolean): Promise<void> {
		this.running = true;
		this.#wanted = sweeps;
		return this.#ask(this.settings, sweeps, resetProtection);
	}

	stop(): void {
		this.running = false;
		this.lost = false;
		this.#giveUp();
		this.#traces.settle();
		this.#acknowledge();
	}

	/**
	 * Puts a new set-up in force: the sweep under way ends, the next one has it. While stopped, one sweep shows it.
	 * @throws Refusal with the receiver's reason; the set-up before stays in force
	 */
	async change(settings: Settings): Promise<void> {
		const before = this.settings;
		const wasRunning = this.running;
		this.settling = true;
		try {
			await this.#ask(settings, wasRunning ? this.#wanted : 1);
		} catch (error) {
			this.settings = before;
			if (wasRunning && error instanceof Refusal && error.status === 422) void this.start(this.#wanted);
			throw error;
		} finally {
			this.settling = false;
		}
	}

	/**
	 * Tells the server what was drawn, now: evidence is about to be taken from it.
	 * @param row waits until this row, which stands in a trace already, has been painted too
	 */
	async settleAcknowledgement(row?: number): Promise<void> {
		if (row !== undefined && this.#drawn.isNew(row)) {
			await nextPaint();
			this.#drawn.upTo(row);
		}
		return this.#drawn.tell();
	}

	/**
	 * Lets something else use the receiver: the sweep under way ends, and sweeping goes on afterwards if it was on.
	 * @throws whatever `act` throws
	 */
	async between<T>(act: () => Promise<T>): Promise<T> {
		const wasRunning = this.running;
		this.stop();
		await this.settleAcknowledgement();
		try {
			const done = await act();
			const { bench } = await this.#wire.reload();
			this.#nextRow = bench.resumeFrom;
			this.benchTimeUsedS = bench.benchTimeUsedS;
			return done;
		} finally {
			if (wasRunning) void this.start(this.#wanted);
		}
	}

	#acknowledge(): void {
		this.settleAcknowledgement().catch((error) =>
			console.warn('Could not tell the server what was drawn.', error)
		);
	}

	#giveUp(): void {
		this.#askings.givenUp();
		this.#stream?.abort();
	}

	/** Resolves once the stream has begun; what follows comes in on its own. */
	async #ask(settings: Settings, sweeps: number | undefined, resetProtection?: boolean): Promise<void> {
		this.#giveUp();
		const stream = new AbortController();
		this.#stream = stream;
		this.#askings.asked();
		const request = {
			settings,
			from: this.#nextRow,
			...(sweeps && { sweeps }),
			...(resetProtection && { resetProtection })
		};
		let frames: AsyncIterable<Frame[]>;
		try {
			frames = await this.#wire.sweeps(request, stream.signal);
		} catch (error) {
			if (stream.signal.aborted) return;
			if (error instanceof Refusal && error.status === 409) return this.#catchUp(settings, sweeps, error);
			this.#askings.answered();
			if (error instanceof Refusal) throw error;
			this.settings = settings;
			void this.#seek(settings, sweeps, stream.signal);
			return;
		}
		if (stream.signal.aborted) return;
		this.#askings.answered();
		this.settings = settings;
		this.ended = undefined;
		this.lost = false;
		void this.#take(frames, sweeps, stream.signal);
	}

	async #take(
		frames: AsyncIterable<Frame[]>,
		sweeps: number | undefined,
		signal: AbortSignal
	): Promise<void> {
		let left = sweeps;
		try {
			for await (const batch of frames) {
				if (signal.aborted) return;
				for (const frame of batch) {
					const whole = this.#receive(frame);
					if (whole !== undefined && left !== undefined) left -= 1;
				}
				this.#traces.show();
				const shownTo = this.#traces.lastRow;
				await nextPaint();
				this.#drawn.upTo(shownTo);
				if (signal.aborted) return;
				if (this.#drawn.isDue()) this.#acknowledge();
				if (this.ended) {
					this.#traces.settle();
					this.#acknowledge();
					return;
				}
			}
		} catch (error) {
			if (signal.aborted) return;
			console.warn('The sweep stream broke off.', error);
		}
		if (signal.aborted) return;
		if (this.#askings.mayComeLate()) void this.#retake(left);
		else void this.#seek(this.settings, left, signal);
	}

	/** Asks for the receiver again, once, after a late request of this page's own has taken it. */
	async #retake(sweeps: number | undefined): Promise<void> {
		this.#askings.forget();
		try {
			await this.#ask(this.settings, sweeps);
		} catch (error) {
			this.#refuse(error as Error);
		}
	}

	#refuse({ message }: Error): void {
		this.running = false;
		this.lost = false;
		this.ended = { reason: 'refused', message };
	}

	#receive(frame: Frame): number | undefined {
		if (frame.type === 'piece') {
			this.#tellTime(frame.clockS);
			const whole = this.#traces.take(frame);
			if (whole !== undefined) this.#nextRow = whole + 1;
			return whole;
		}
		if (frame.type === 'state') this.#begin(frame.json);
		else this.#end(frame.json);
		return undefined;
	}

	#begin(json: unknown): void {
		const state = streamState.parse(json);
		this.resolved = state.resolved;
		this.setUp = state.setUp;
		this.flags = state.flags;
		this.speedUp = state.speedUp;
		this.#clock = { clockS: state.clockS, usedS: state.benchTimeUsedS };
		this.benchTimeUsedS = state.benchTimeUsedS;
		this.#nextRow = state.fromRow;
		if (state.restartRow !== this.#traces.restartRow) this.#traces.restart(state.restartRow);
		this.#traces.use(state.resolved);
	}

	#end(json: unknown): void {
		const end = streamEnd.parse(json);
		this.benchTimeUsedS = end.benchTimeUsedS;
		if (end.reason === 'server-stopping') return;
		if (end.reason === 'taken-over' && this.#askings.mayComeLate()) return;
		this.ended = { reason: end.reason, message: end.message };
		this.running = false;
		if (end.reason === 'closed') this.closed = true;
		if (end.reason === 'input-protection') this.flags = withProtection(this.flags);
	}

	#tellTime(clockS: number): void {
		this.benchTimeUsedS = Math.max(this.benchTimeUsedS, this.#clock.usedS + clockS - this.#clock.clockS);
	}

	/** Another tab or device has gone on: load where the bench stands, and go on from there. */
	async #catchUp(settings: Settings, sweeps: number | undefined, refusal: Refusal): Promise<void> {
		const { bench, state } = await this.#wire.reload();
		if (state === 'closed') {
			this.stop();
			this.closed = true;
			return;
		}
		if (bench.resumeFrom === this.#nextRow) throw refusal;
		this.#nextRow = bench.resumeFrom;
		return this.#ask(settings, sweeps);
	}

	/** Asks again, waiting longer each time, until it is answered or stopped. */
	async #seek(settings: Settings, sweeps: number | undefined, signal: AbortSignal): Promise<void> {
		if (sweeps === 0) return;
		this.lost = true;
		for (let tries = 0; !signal.aborted; tries++) {
			await pause(retryAfterMs[Math.min(tries, retryAfterMs.length - 1)]);
			if (signal.aborted) return;
			try {
				const frames = await this.#wire.sweeps(
					{ settings, from: this.#nextRow, ...(sweeps && { sweeps }) },
					signal
				);
				this.lost = false;
				return void this.#take(frames, sweeps, signal);
			} catch (error) {
				if (error instanceof Refusal) return this.#refuse(error);
			}
		}
	}
}
