import { isProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';
import type { BenchRequest, CountRequest } from '$lib/schemas/reading';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import { countFrequency } from '../receiver/count';
import type { Seed } from '../receiver/random';
import { resolveSettings } from '../receiver/resolve-settings';
import { restartsTraces } from '../receiver/restarts-traces';
import type { BenchReading, SettingsLogEntry, TakenReading } from './attempt-record';
import { keptTrace } from './kept-traces';
import { patchSettings } from './patch-settings';

/** What sweeps: row after row of detected levels, and how long each takes on the bench clock. */
export interface Sweeper {
	row(n: number, clockS: number): ArrayLike<number>;
	durationS(n: number): number;
}
/** Makes a sweeper for one set-up. The receiver's own, unless a proof plants a fault in it. */
export type SweepWith = (
	scene: Scene,
	profile: ReceiverProfile,
	resolved: ResolvedSettings,
	seed: Seed
) => Sweeper;

/** One person at one bench: settings typed, sweeps drawn, readings taken, with the log that an attempt stores. */
export class BenchSession {
	readonly log: SettingsLogEntry[] = [];
	readonly readings: TakenReading[] = [];
	private settings: Settings;
	private resolved: ResolvedSettings;
	private rows: ArrayLike<number>[] = [];
	private row = 0;
	private clockS = 0;

	constructor(
		private readonly scene: Scene,
		private readonly profile: ReceiverProfile,
		private readonly seed: Seed,
		start: Settings,
		private readonly sweepWith: SweepWith
	) {
		this.settings = start;
		this.resolved = resolveSettings(start, profile);
	}

	/** Types changes over the present settings. @throws BenchError by field when the receiver can't do that */
	set(changes: Settings): void {
		this.settings = patchSettings(this.settings, changes);
		const resolved = resolveSettings(this.settings, this.profile);
		if (restartsTraces(this.resolved, resolved)) this.rows = [];
		this.resolved = resolved;
	}

	sweep(count: number): void {
		const sweeper = this.sweepWith(this.scene, this.profile, this.resolved, this.seed);
		this.log.push({ settings: this.settings, firstRow: this.row, sweeps: count, clockS: this.clockS });
		for (let i = 0; i < count; i++) {
			this.rows.push(sweeper.row(this.row, this.clockS));
			this.clockS += sweeper.durationS(this.row);
			this.row += 1;
		}
	}

	/**
	 * Takes a reading off a trace of the present set-up, or counts with it.
	 * @param traceNumber 1…4
	 * @throws BenchError when nothing was swept, there is no such trace, or no number exists
	 */
	read(request: BenchRequest, traceNumber: number): TakenReading {
		if (request.kind === 'count') return this.count(request);
		const { trace, rowCount } = this.trace(traceNumber);
		const reading = takeReading(trace, request);
		if (isProblem(reading)) throw new BenchError('reading', `${reading.problem} (${reading.needs})`);
		return this.taken(request, reading, traceNumber, { from: this.row - rowCount, to: this.row - 1 });
	}

	/** Counts: takes a row number of its own and its gate's time on the bench clock; traces stay as they are. */
	private count(request: CountRequest): TakenReading {
		const { scene, profile, resolved, seed, row, clockS } = this;
		const reading = countFrequency(scene, profile, resolved, seed, request, row, clockS);
		if ('problem' in reading) throw new BenchError('reading', `${reading.problem} (${reading.needs})`);
		this.log.push({ settings: this.settings, firstRow: row, sweeps: 0, clockS });
		this.row += 1;
		this.clockS += request.gateS;
		return this.taken(request, reading, 1, { from: row, to: row });
	}

	private taken(
		request: BenchRequest,
		reading: BenchReading,
		trace: number,
		rows: TakenReading['rows']
	): TakenReading {
		const taken = { id: String(this.readings.length + 1), request, reading, trace, rows };
		this.readings.push(taken);
		return taken;
	}

	private trace(traceNumber: number): { trace: Trace; rowCount: number } {
		const { resolved } = this;
		const shown = resolved.traces[traceNumber - 1];
		if (!shown)
			throw new BenchError('trace', `the set-up has ${resolved.traces.length}; asked for ${traceNumber}`);
		const last = shown.mode === 'average' ? shown.count : shown.mode === 'live' ? 1 : this.rows.length;
		const rows = this.rows.slice(-last);
		if (rows.length === 0) throw new BenchError('sweep', 'nothing has been swept with this set-up');
		const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
		const levelsDbm = keptTrace(rows, shown.mode, shown.count, scale);
		const setUp = { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb };
		return {
			trace: { ...setUp, mode: shown.mode, count: rows.length, levelsDbm },
			rowCount: rows.length
		};
	}
}
