/** The bench as it stands, for a picture or a file: plain values, so that what is kept doesn't change under the pen. */
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { traceWords } from '../setup/setup-words';
import { readingKind } from '../readings/reading-kinds';
import { levelAt } from '../plot/plot-frame';
import type { PlottedBand, PlottedMarker } from '../plot/plotted';
import { shownReading } from '../shown-quantity';
import type { Bench } from '../state/bench.svelte';

export interface TraceSnapshot {
	/** "1 Average of 16" */
	words: string;
	levelsDbm: ArrayLike<number>;
}

export interface BenchSnapshot {
	settings: Settings;
	resolved: ResolvedSettings;
	axis: { kind: 'frequency' | 'time'; start: number; stop: number };
	traces: TraceSnapshot[];
	markers: PlottedMarker[];
	bands: PlottedBand[];
	/** "Sweep 14" */
	sweep: string;
	title: string;
	/** "Work order 6.2, second attempt" */
	order: string;
	client: string;
	receiver: string;
}

/** What the bench shows now; while sweeps are played back, the sweep that is shown. */
export function snapshotOf(bench: Bench, order: string): BenchSnapshot {
	const { recording, index, tracesDbm } = bench.playback;
	const resolved = recording?.resolved ?? bench.run.resolved;
	const axis = bench.axisOf(resolved);
	const levels = recording ? tracesDbm : bench.traces.shown.map(({ drawnDbm }) => drawnDbm);
	const row = recording ? recording.rows[index].row : bench.traces.lastRow;
	return {
		settings: bench.run.settings,
		resolved,
		axis,
		traces: resolved.traces.map((trace, i) => ({
			words: `${i + 1} ${traceWords(trace)}`,
			levelsDbm: levels[i] ?? []
		})),
		markers: bench.markers.list.flatMap(({ letter, at, trace }) => {
			const line = levels[trace - 1] ?? [];
			const levelDbm = levelAt(line, axis, at);
			if (levelDbm === undefined) return [];
			return [{ letter, at, levelDbm, selected: false, where: '' }];
		}),
		bands: recording ? [] : bandsOf(bench),
		sweep: row === undefined ? 'Nothing swept' : `Sweep ${row + 1}`,
		title: bench.attempt.exercise.title,
		order,
		client: bench.attempt.exercise.client,
		receiver: bench.attempt.exercise.receiver.name
	};
}

function bandsOf(bench: Bench): PlottedBand[] {
	return bench.readings.followingRows.flatMap((row, i) => {
		const { id, values, trace } = bench.readings.following[i];
		const band = readingKind(row.request.kind)?.band?.(values);
		if (!band || !row.outcome || !('value' in row.outcome)) return [];
		const { figure, unit } = shownReading(row.outcome.value, row.outcome.unit);
		const what = row.words.charAt(0).toLowerCase() + row.words.slice(1).replace(', ', ' in ');
		return [{ id: String(id), ...band, trace: trace - 1, figure, unit, what, detail: '' }];
	});
}
