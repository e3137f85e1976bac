/** The words of the set-up strip. */
import type { Detector, ResolvedSettings, Scale, TraceMode } from '$lib/schemas/settings';
import { formatFigure } from '$lib/units/format-quantity';

export const detectorWords: Record<Detector, string> = {
	'rise-fall': 'rise and fall',
	'positive-peak': 'positive peak',
	'negative-peak': 'negative peak',
	sample: 'sample',
	average: 'average'
};
export const scaleWords: Record<Scale, string> = { log: 'decibels', power: 'power', voltage: 'voltage' };
export const modeWords: Record<TraceMode, string> = {
	live: 'Live',
	average: 'Average',
	'max-hold': 'Hold maximum',
	'min-hold': 'Hold minimum',
	kept: 'Kept as it is'
};

/** What a trace does, in words: "Average of 16". */
export const traceWords = ({ mode, count }: { mode: TraceMode; count: number }): string =>
	mode === 'average' ? `Average of ${count}` : modeWords[mode];

/** Names of settings as a refusal speaks of them. */
export const settingWords: Record<string, string> = {
	centreHz: 'Centre',
	spanHz: 'Span',
	startHz: 'Start',
	stopHz: 'Stop',
	rbwHz: 'Resolution',
	vbwHz: 'Video',
	sweepTimeS: 'Sweep time',
	points: 'Points',
	detector: 'Detector',
	scale: 'Averages',
	referenceDbm: 'Reference',
	attenuationDb: 'Attenuation',
	preamp: 'Preamplifier',
	correctionDb: 'Correction',
	traces: 'Traces',
	input: 'Input'
};

/** What a correction does, in words; empty when it does nothing. */
export function correctionWords(correction: ResolvedSettings['correctionDb']): string {
	if (typeof correction === 'number') {
		if (correction === 0) return '';
		const figure = formatFigure(Math.abs(correction), Number.isInteger(correction * 10) ? 1 : 2);
		return correction > 0 ? `Loss of ${figure} dB added back` : `${figure} dB taken off, as for a gain`;
	}
	const losses = correction.map(({ db }) => db);
	const [least, most] = [Math.min(...losses), Math.max(...losses)].map((db) => formatFigure(db, 1));
	return `Loss of ${least}${least === most ? '' : ` to ${most}`} dB added back`;
}
