import { combineRows } from '$lib/measure/combine-rows';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { countRows, type DrawnRows } from './drawn-rows';
import { LeastRecentlyUsed } from '../process/least-recently-used';
import type { SignalSource } from './prepared-bench';
import { replayRows } from './replay-rows';

type Shown = ResolvedSettings['traces'][number];

/** Rows that a hold gathers before it folds them in. */
const FOLD = 64;
/** Levels that an average may keep at once: it needs every row, in order, to come out the same to the last bit. */
const MOST_LEVELS = 2e7;

// Several readings off one trace are the rule: the rows are swept again once. Only a cache, keyed by all that decides.
const traces = new LeastRecentlyUsed<string, Promise<Float32Array>>(32);

/** Whether an average of so many rows of so many points can be replayed. */
export const isReplayable = ({ mode }: Shown, stretches: DrawnRows[], points: number): boolean =>
	mode !== 'average' || countRows(stretches) * points <= MOST_LEVELS;

/** The trace that these rows make, from sweeping them again: to the last bit what the page makes of what it was sent. */
export function replayedTrace(
	source: SignalSource,
	stretches: DrawnRows[],
	shown: Shown,
	scale: ResolvedSettings['scale']
): Promise<Float32Array> {
	const rows = stretches.map(({ setUp, fromRow, toRow }) => `${setUp.number}:${fromRow}-${toRow}`);
	const key = [source.seed, shown.mode, shown.count, ...rows].join(' ');
	return traces.get(key, () => {
		const made = sweepAgain(source, stretches, shown, scale);
		made.catch(() => traces.forget(key));
		return made;
	});
}

async function sweepAgain(
	source: SignalSource,
	stretches: DrawnRows[],
	{ mode, count }: Shown,
	scale: ResolvedSettings['scale']
): Promise<Float32Array> {
	let rows: Float32Array[] = [];
	for await (const { levelsDbm } of replayRows(source, stretches)) {
		rows.push(levelsDbm);
		// A hold of holds is the hold of all; no other mode may be folded.
		const holds = mode === 'max-hold' || mode === 'min-hold';
		if (holds && rows.length >= FOLD) rows = [combineRows(rows, mode, count, scale)];
	}
	return combineRows(rows, mode, count, scale);
}
