/** A set-up in words, a group a line. */
import type { Detector, ResolvedSettings, Scale, TraceMode } from '$lib/schemas/settings';
import { formatFigure, formatFrequency, formatTime } from '$lib/units/format-quantity';

const DETECTORS: Record<Detector, string> = {
	'rise-fall': 'rise and fall',
	'positive-peak': 'positive peak',
	'negative-peak': 'negative peak',
	sample: 'sample',
	average: 'average'
};
const SCALES: Record<Scale, string> = { log: 'decibels', power: 'power', voltage: 'voltage' };
const MODES: Record<TraceMode, string> = {
	live: 'live',
	average: 'average',
	'max-hold': 'hold maximum',
	'min-hold': 'hold minimum',
	kept: 'kept'
};
const decibels = (value: number) => formatFigure(value, Number.isInteger(value) ? 0 : 1);

export function presentSetUp(resolved: ResolvedSettings): { label: string; text: string }[] {
	const { centreHz, spanHz, rbwHz, vbwHz, points, preamp, input, correctionDb } = resolved;
	const correction =
		typeof correctionDb === 'number'
			? `correction ${decibels(correctionDb)} dB`
			: `correction from a table of ${correctionDb.length}`;
	const connected = `${input.padDb ? `${input.padDb} dB pad` : 'no pad'}, ${input.dcBlock ? 'DC block' : 'no DC block'}`;
	return [
		{ label: 'Tune', text: `centre ${formatFrequency(centreHz)}, span ${formatFrequency(spanHz)}` },
		{
			label: 'Resolve',
			text: `resolution ${formatFrequency(rbwHz)}, video ${formatFrequency(vbwHz)}, ${points} points`
		},
		{
			label: 'Level',
			text: `reference ${decibels(resolved.referenceDbm)} dBm, attenuation ${decibels(resolved.attenuationDb)} dB, preamplifier ${preamp ? 'on' : 'off'}, ${correction}`
		},
		{
			label: 'Sweep',
			text: `${formatTime(Number(resolved.sweepTimeS.toPrecision(3)))}, detector ${DETECTORS[resolved.detector]}, averages of ${SCALES[resolved.scale]}`
		},
		{
			label: 'Traces',
			text: resolved.traces
				.map(({ mode, count }, i) => `${i + 1} ${MODES[mode]}${mode === 'average' ? ` of ${count}` : ''}`)
				.join(', ')
		},
		{ label: 'Input', text: input.connected ? connected : 'matched load' }
	];
}
