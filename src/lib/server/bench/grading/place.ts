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

/** What truly stands where the receiver of a reading displays `hz`. */
export const trueHz = ({ displayedPerHz }: Source, hz: number | undefined): number | undefined =>
	hz === undefined ? undefined : hz / displayedPerHz;

/**
 * Where a reading was taken, Hz as it truly is: where its marker came to stand, else where it was put; in span 0, where the
 * receiver stood.
 */
export function takenAtHz(source: Source): number | undefined {
	const { reading, request, setUp } = source;
	const standing = setUp.resolved.spanHz === 0 ? setUp.resolved.centreHz : undefined;
	return trueHz(source, placeHz(reading) ?? (quantityFrequencyHz(request) || standing));
}
