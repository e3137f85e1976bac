import type { BenchRequest } from '$lib/schemas/reading';
import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import { shortFigure } from '../exercise/figure';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import { asksPlace } from './asked';
import { widthHzOf } from './read-width';

const NAMES: Partial<Record<BenchRequest['kind'], string>> = {
	count: 'frequency count',
	marker: 'marker',
	delta: 'difference of two markers',
	peak: 'highest point',
	'next-peak': 'next peak',
	minimum: 'lowest point',
	'noise-density': 'noise density',
	'x-db-bandwidth': 'bandwidth',
	thd: 'harmonic distortion',
	'am-depth': 'modulation depth',
	'fm-deviation': 'deviation',
	'phase-noise': 'phase noise',
	'carrier-to-noise': 'carrier to noise',
	'adjacent-channel': 'adjacent-channel power'
};

/** What is asked or read, in words: "channel power". */
export const quantityName = (kind: string): string =>
	NAMES[kind as BenchRequest['kind']] ?? kind.replaceAll('-', ' ');

/** What a question asks for, in words: "channel power", "frequency", "distance". */
export function askedName(question: NumberQuestion): string {
	const { quantity, part, unit } = question;
	if (asksPlace(question)) return 'frequency';
	if (part === undefined || typeof part !== 'string') return quantityName(quantity.kind);
	if (quantity.kind === 'delta' && unit === 'Hz') return 'distance in frequency';
	return PARTS[part] ?? quantityName(quantity.kind);
}

const PARTS: Partial<Record<string, string>> = {
	modulatingHz: 'modulating frequency',
	repetitionHz: 'repetition frequency',
	widthS: 'pulse width',
	onS: 'time on',
	riseS: 'rise time',
	fallS: 'fall time',
	periodS: 'period',
	carrierDbm: 'carrier level',
	noiseDbm: 'noise in the width',
	fromDbm: 'level of the first',
	toDbm: 'level of the second',
	index: 'modulation index',
	marginDb: 'margin'
};

/** A reading in words, with its width or place: "channel power, 25 kHz". */
export function describeReading(request: BenchRequest): string {
	return [quantityName(request.kind), ...details(request)].filter(Boolean).join(', ');
}

function details(request: BenchRequest): string[] {
	const width = widthHzOf(request);
	const atHz = quantityFrequencyHz(request);
	switch (request.kind) {
		case 'count':
			return [`at ${formatFrequency(atHz)}`, `gate ${formatTime(request.gateS)}`];
		case 'delta':
			return request.fromHz === undefined || request.toHz === undefined
				? []
				: [`from ${formatFrequency(request.fromHz)} to ${formatFrequency(request.toHz)}`];
		case 'occupied-bandwidth':
			return [
				`${shortFigure(request.percent, 2)} %`,
				...(width === undefined ? [] : [`within ${formatFrequency(width)}`])
			];
		case 'x-db-bandwidth':
			return [`${shortFigure(request.db, 2)} dB down`];
		case 'adjacent-channel':
			return request.offsets.map(
				({ offsetHz, widthHz }) => `${formatFrequency(widthHz)} at ±${formatFrequency(offsetHz)}`
			);
		case 'phase-noise':
			return [`${formatFrequency(Math.abs(request.offsetHz))} from ${formatFrequency(atHz)}`];
		default:
			return [width !== undefined ? formatFrequency(width) : atHz > 0 ? `at ${formatFrequency(atHz)}` : ''];
	}
}
