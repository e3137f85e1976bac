import type { ReportPicture } from '$lib/schemas/report';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import type { SetUp } from '$lib/server/db/models/set-up';
import { drawnRows, lastRows } from './drawn-rows';
import type { SignalSource } from './prepared-bench';
import { isReplayable, replayedTrace } from './replayed-trace';
import { setUpOfRow } from './set-up-log';

type Shown = ResolvedSettings['traces'][number];

/** The traces of an attempt as they stood after one of its rows; null when they can't be made again. */
export async function reportPicture(
	source: SignalSource,
	log: SetUp[],
	row: number,
	resolved: ResolvedSettings
): Promise<Omit<ReportPicture, 'marks'> | null> {
	const setUp = setUpOfRow(log, row);
	if (!setUp || source.engineVersion !== ENGINE_VERSION) return null;
	const levelsOf = async (shown: Shown): Promise<number[]> => {
		const drawn = drawnRows(log, setUp.restartRow, row);
		const rows =
			shown.mode === 'live'
				? lastRows(drawn, 1)
				: shown.mode === 'average'
					? lastRows(drawn, shown.count)
					: drawn;
		if (shown.mode === 'kept' || rows.length === 0 || !isReplayable(shown, rows, resolved.points)) return [];
		const levelsDbm = await replayedTrace(source, rows, shown, resolved.scale);
		return Array.from(levelsDbm, (level) => Math.round(level * 100) / 100);
	};
	const traces = [];
	for (const shown of resolved.traces)
		traces.push({ mode: shown.mode, count: shown.count, levelsDbm: await levelsOf(shown) });
	return { row, traces };
}
