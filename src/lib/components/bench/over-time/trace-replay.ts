/** The traces of a recording as they stood after any of its sweeps. */
import { combineRows } from '$lib/measure/combine-rows';
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { Recording } from './recording';

type TraceSetUp = ResolvedSettings['traces'][number];
type Hold = 'max-hold' | 'min-hold';

/** Goes forward cheaply: what a hold held after the sweep before is kept. */
export class TraceReplay {
	readonly #recording: Recording;
	#held: Partial<Record<Hold, { index: number; levelsDbm: Float32Array }>> = {};

	constructor(recording: Recording) {
		this.#recording = recording;
	}

	/**
	 * Levels of each trace after the sweep at `index`, in dBm. A kept trace is empty: what it was kept of is not recorded.
	 */
	after(index: number): Float32Array[] {
		return this.#recording.resolved.traces.map((setUp) => this.#trace(setUp, index));
	}

	#trace({ mode, count }: TraceSetUp, index: number): Float32Array {
		const { rows, resolved } = this.#recording;
		if (mode === 'kept') return new Float32Array();
		if (mode === 'live') return rows[index].levelsDbm;
		if (mode !== 'average') return this.#hold(mode, index);
		const covered = rows.slice(Math.max(0, index - count + 1), index + 1);
		return combineRows(
			covered.map(({ levelsDbm }) => levelsDbm),
			mode,
			count,
			resolved.scale
		);
	}

	#hold(mode: Hold, index: number): Float32Array {
		const { rows, resolved } = this.#recording;
		const before = this.#held[mode];
		const goesOn = before !== undefined && before.index <= index;
		const fresh = rows.slice(goesOn ? before.index + 1 : 0, index + 1).map(({ levelsDbm }) => levelsDbm);
		const all = goesOn ? [before.levelsDbm, ...fresh] : fresh;
		const levelsDbm = combineRows(all, mode, 1, resolved.scale);
		this.#held[mode] = { index, levelsDbm };
		return levelsDbm;
	}
}
