import type { Reading } from '$lib/measure/reading';

/** Where on the frequency axis a reading of one point stands, Hz. */
export function placeHz({ parts }: Reading): number | undefined {
	return parts && 'frequencyHz' in parts ? parts.frequencyHz : undefined;
}
