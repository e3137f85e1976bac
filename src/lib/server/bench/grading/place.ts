import type { BenchReading } from '../exercise/attempt-record';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import type { Source } from './evidence';

/** Where on the frequency axis a reading of one point stands, or what was counted, Hz. */
export function placeHz(reading: BenchReading): number | undefined {
	if (reading.kind === 'count') return reading.value;
	// A delta's frequency is a distance.
	if (reading.kind === 'delta' || !reading.parts || !('frequencyHz' in reading.parts)) return undefined;
	return reading.parts.frequencyHz;
}

/** Where a reading was taken, Hz: where its marker came to stand, else where it was put; in span 0, where the receiver stood. */
export const takenAtHz = ({ reading, request, setUp: { resolved } }: Source): number | undefined =>
	placeHz(reading) ??
	(quantityFrequencyHz(request) || (resolved.spanHz === 0 ? resolved.centreHz : undefined));
