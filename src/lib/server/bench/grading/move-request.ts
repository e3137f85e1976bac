import type { BenchRequest } from '$lib/schemas/reading';

/** Fields that say where in frequency something is asked. */
const PLACES = [
	'atHz',
	'centreHz',
	'carrierHz',
	'fundamentalHz',
	'startHz',
	'stopHz',
	'lowerHz',
	'upperHz',
	'noiseHz',
	'toHz'
];

/** A reading asked for on a scale that shows `perHz` for each true hertz, with its places as they truly are. */
export function onTrueScale<T extends { kind: string }>(asked: T, perHz: number): T {
	const fields = Object.entries(asked).map(([key, value]) => [
		key,
		(PLACES.includes(key) || key === 'fromHz') && typeof value === 'number'
			? value / perHz
			: (value as unknown)
	]);
	return Object.fromEntries(fields) as T;
}

/** The same asked `byHz` farther up; of a difference, its second marker alone. */
export function moved<T extends { kind: string }>(asked: T, byHz: number): T {
	const fields = Object.entries(asked).map(([key, value]) => [
		key,
		PLACES.includes(key) && typeof value === 'number' ? value + byHz : (value as unknown)
	]);
	return Object.fromEntries(fields) as T;
}

/** A reading taken `byHz` farther up; what finds its own place, like a peak, becomes a marker at `atHz`. */
export function movedReading(request: BenchRequest, byHz: number, atHz: number): BenchRequest {
	const findsItself = request.kind === 'peak' || request.kind === 'next-peak' || request.kind === 'minimum';
	return findsItself ? { kind: 'marker', atHz } : moved(request, byHz);
}
