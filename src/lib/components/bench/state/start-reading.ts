/** How a reading is started on a bench. */
import type { BenchRequest, CountRequest } from '$lib/schemas/reading';
import { formatTime } from '$lib/units/format-quantity';
import { readingKind, type ReadingContext } from '../readings/reading-kinds';
import type { Bench } from './bench.svelte';
import type { Marker } from './marker-list.svelte';

export function readingContext({ markers, run, attempt }: Bench): ReadingContext {
	const { selected, list } = markers;
	const other = list.find((marker) => marker.letter !== selected?.letter);
	const { resolved } = run;
	// In span 0 a marker stands in time, and what is read is at the centre.
	const hz = (marker: Marker | undefined) => (resolved.spanHz > 0 ? marker?.at : undefined);
	return {
		resolved,
		limits: attempt.exercise.mask?.limits,
		markerHz: hz(selected),
		otherMarkerHz: hz(other)
	};
}

/**
 * Starts a reading. A reading of power puts detector and averages on power first, where the log shows it; a count is
 * taken at once.
 */
export async function startReading(
	bench: Bench,
	request: BenchRequest,
	values: Record<string, number>
): Promise<void> {
	if (request.kind === 'count') return count(bench, request);
	bench.readings.follow(request, values);
	const { detector, scale } = bench.run.resolved;
	if (!readingKind(request.kind)?.power || (detector === 'average' && scale === 'power')) return;
	await bench.sheet.setAll({ detector: 'average', scale: 'power' });
	bench.notice = 'Detector set to average and averages to power: a power reading adds power.';
}

async function count(bench: Bench, request: CountRequest): Promise<void> {
	const at = bench.markers.list.find((marker) => marker.at === request.atHz);
	bench.notice = `Counting for ${formatTime(request.gateS)} …`;
	try {
		await bench.readings.count(request, at?.letter);
		bench.notice = undefined;
	} catch {
		bench.notice = 'The server could not be reached; nothing was counted.';
	}
}
