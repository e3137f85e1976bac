/** What is done with markers on a bench: put on a peak, kept on it, read out. */
import { isProblem } from '$lib/measure/reading';
import { takeReading } from '$lib/measure/take-reading';
import type { ReadingRequest } from '$lib/schemas/reading';
import type { ReadingRow } from '../readings/reading-row';
import { shownOutcome } from '../readings/shown-outcome';
import type { Bench } from './bench.svelte';

/** Where to put a marker: the highest point, or the next one to a side. */
export type PeakStep = 'highest' | 'left' | 'right';

const inUse = 'All eight markers are in use. Take one away first.';

/** Puts a marker on the highest point, or on the next peak to a side of where it stands. */
export function toPeak(bench: Bench, letter: string, step: PeakStep): void {
	const marker = bench.markers.find(letter);
	const trace = marker && bench.readings.traceOf(marker.trace);
	if (!marker || !trace) return;
	const request: ReadingRequest =
		step === 'highest'
			? { kind: 'peak' }
			: { kind: 'next-peak', fromHz: marker.at, side: step === 'left' ? 'lower' : 'upper' };
	const outcome = takeReading(trace, request);
	if (isProblem(outcome)) {
		bench.notice = `${outcome.problem} ${outcome.needs}`;
		return;
	}
	const place = placeOf(outcome.parts);
	if (place !== undefined) bench.markers.move(letter, place);
}

/** Adds a marker at a place, by default on the highest point, else in the middle. */
export function addMarker(bench: Bench, at?: number): void {
	const { start, stop } = bench.axis;
	const marker = bench.markers.add(at ?? (start + stop) / 2);
	if (!marker) bench.notice = inUse;
	else if (at === undefined) toPeak(bench, marker.letter, 'highest');
}

/** Adds a marker that keeps to the highest point. */
export function followPeak(bench: Bench): void {
	const { start, stop } = bench.axis;
	if (!bench.markers.add((start + stop) / 2, { follows: 'peak' })) bench.notice = inUse;
	keepFollowing(bench);
}

/** Puts the markers that follow something where it is now. */
export function keepFollowing(bench: Bench): void {
	for (const marker of bench.markers.list.filter(({ follows }) => follows)) {
		const trace = bench.readings.traceOf(marker.trace);
		const outcome = trace && takeReading(trace, { kind: 'peak' });
		const place = outcome && !isProblem(outcome) ? placeOf(outcome.parts) : undefined;
		if (place !== undefined && place !== marker.at) bench.markers.keepAt(marker.letter, place);
	}
}

/** A marker as it is read out: letter, place, level. */
export function spokenMarker(bench: Bench, row: ReadingRow): string {
	const { letter, words, atHz, outcome, relative } = row;
	const place = atHz === undefined ? '' : `${relative && atHz > 0 ? 'plus ' : ''}${bench.writePlace(atHz)}, `;
	if (outcome && 'problem' in outcome) return `${words} ${letter}: ${outcome.problem}`;
	const shown = shownOutcome(row, bench.levels, bench.run.resolved.centreHz);
	if (!shown) return `${words} ${letter}: nothing swept yet.`;
	return `${words} ${letter}: ${place}${shown.figure} ${shown.unit}`.replaceAll('−', 'minus ');
}

function placeOf(parts: unknown): number | undefined {
	if (typeof parts !== 'object' || parts === null) return undefined;
	const { frequencyHz, timeS } = parts as { frequencyHz?: number; timeS?: number };
	return frequencyHz ?? timeS;
}
