import type { ReadingMark } from '$lib/schemas/done-right';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import { widthHzOf } from './read-width';

/** Where a reading is drawn: the band it found or was asked over, else the point it stands at; null where it has no place. */
export function readingMark(request: { kind: string }, parts: unknown): ReadingMark | null {
	const found = (parts ?? {}) as Partial<Record<'lowerHz' | 'upperHz' | 'frequencyHz', number>>;
	if (found.lowerHz !== undefined && found.upperHz !== undefined) {
		return { startHz: found.lowerHz, stopHz: found.upperHz };
	}
	// The frequency of a difference is a distance.
	if (found.frequencyHz !== undefined && request.kind !== 'delta') return { frequencyHz: found.frequencyHz };
	const atHz = quantityFrequencyHz(request);
	const width = widthHzOf(request);
	if (width !== undefined && atHz > 0) return { startHz: atHz - width / 2, stopHz: atHz + width / 2 };
	return atHz > 0 ? { frequencyHz: atHz } : null;
}
