import type { ReadingRequest } from '$lib/measure/reading-request';
import { formatFrequency } from '$lib/units/format-quantity';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import { widthHzOf } from './read-width';

const NAMES: Partial<Record<ReadingRequest['kind'], string>> = {
	marker: 'marker',
	delta: 'difference of two markers',
	peak: 'highest point',
	'next-peak': 'next peak',
	minimum: 'lowest point',
	'noise-density': 'noise density',
	'x-db-bandwidth': 'bandwidth x dB down',
	thd: 'harmonic distortion',
	'am-depth': 'modulation depth',
	'fm-deviation': 'deviation',
	'phase-noise': 'phase noise',
	'carrier-to-noise': 'carrier to noise',
	'adjacent-channel': 'adjacent-channel power'
};

/** What is asked or read, in words: "channel power". */
export const quantityName = (kind: string): string =>
	NAMES[kind as ReadingRequest['kind']] ?? kind.replaceAll('-', ' ');

/** A reading in words, with its width or place: "channel power, 25 kHz". */
export function describeReading(request: { kind: string }): string {
	const width = widthHzOf(request);
	const atHz = quantityFrequencyHz(request);
	const where = width !== undefined ? formatFrequency(width) : atHz > 0 ? `at ${formatFrequency(atHz)}` : '';
	return [quantityName(request.kind), where].filter(Boolean).join(', ');
}
