import type { BenchReading } from '../exercise/attempt-record';

/** Where on the frequency axis a reading of one point stands, or what was counted, Hz. */
export function placeHz(reading: BenchReading): number | undefined {
	if (reading.kind === 'count') return reading.value;
	// A delta's frequency is a distance.
	if (reading.kind === 'delta' || !reading.parts || !('frequencyHz' in reading.parts)) return undefined;
	return reading.parts.frequencyHz;
}
