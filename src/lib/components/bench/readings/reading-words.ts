/** What a reading is called in the table: its kind and the width, share or place that tells it from its like. */
import type { BenchRequest } from '$lib/schemas/reading';
import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import { readingKind } from './reading-kinds';

/** "Channel power, 25 kHz" */
export function readingWords(request: BenchRequest): string {
	const label = readingKind(request.kind)?.label ?? markerWords[request.kind] ?? request.kind;
	const detail = detailOf(request);
	return detail ? `${label}, ${detail}` : label;
}

const markerWords: Record<string, string> = {
	marker: 'Marker',
	delta: 'Marker, from another',
	peak: 'Highest point',
	'next-peak': 'Next peak',
	minimum: 'Lowest point'
};

function detailOf(request: BenchRequest): string {
	switch (request.kind) {
		case 'channel-power':
		case 'power-density':
			return formatFrequency(request.widthHz);
		case 'band-power':
			return formatFrequency(request.stopHz - request.startHz);
		case 'adjacent-channel':
			return request.offsets.map(({ offsetHz }) => `±${formatFrequency(offsetHz)}`).join(', ');
		case 'occupied-bandwidth':
			return `${request.percent} %`;
		case 'x-db-bandwidth':
			return `−${request.db} dB`;
		case 'carrier-to-noise':
			return formatFrequency(request.widthHz);
		case 'count':
			return `gate ${formatTime(request.gateS)}`;
		case 'phase-noise':
			return `at ${formatFrequency(request.offsetHz)}`;
		default:
			return '';
	}
}

/** Where a reading stands on the frequency axis; undefined where it has no one place. */
export function readingPlace(request: BenchRequest): number | undefined {
	if ('centreHz' in request) return request.centreHz;
	if ('carrierHz' in request) return request.carrierHz;
	if ('atHz' in request) return request.atHz;
	if (request.kind === 'band-power') return (request.startHz + request.stopHz) / 2;
	if ('fundamentalHz' in request) return request.fundamentalHz;
	return undefined;
}

/** Where a reading that the server took comes from: its sweeps, or the counter. */
export const sourceWords = ({
	rows,
	trace
}: {
	rows: { from: number; to: number };
	trace: number | null;
}): string => (trace === null ? 'the counter' : takenFromWords(rows, trace));

/** "sweep 14, trace 1" or "sweeps 3 to 14, trace 1"; rows count from 0, sweeps from 1. */
export function takenFromWords(rows: { from: number; to: number }, trace: number): string {
	const sweeps = rows.from === rows.to ? `sweep ${rows.to + 1}` : `sweeps ${rows.from + 1} to ${rows.to + 1}`;
	return `${sweeps}, trace ${trace}`;
}
