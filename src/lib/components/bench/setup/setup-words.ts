/** The words of the set-up strip. */
import type { Detector, Scale, TraceMode } from '$lib/schemas/settings';

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
