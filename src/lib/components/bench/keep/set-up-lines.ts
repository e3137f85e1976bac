/** A set-up in words for a title block, a report or a file: one group a line, as the strip has them. */
import { formatFigure, formatFrequency, formatTime } from '$lib/units/format-quantity';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { detectorWords, scaleWords, traceWords } from '../setup/setup-words';

export interface SetUpLine {
	label: string;
	text: string;
}

const decibels = (value: number) => formatFigure(value, Number.isInteger(value) ? 0 : 1);
const seconds = (timeS: number) => formatTime(Number(timeS.toPrecision(3)));

export function correctionWords({ correctionDb }: Pick<ResolvedSettings, 'correctionDb'>): string {
	return typeof correctionDb === 'number'
		? `correction ${decibels(correctionDb)} dB`
		: `correction from a table of ${correctionDb.length}`;
}

export function inputWords({ input }: Pick<ResolvedSettings, 'input'>): string {
	if (!input.connected) return 'matched load';
	return `${input.padDb ? `${input.padDb} dB pad` : 'no pad'}, ${input.dcBlock ? 'DC block' : 'no DC block'}`;
}

/** Tune, resolve, level, sweep, traces and input, each as one line. */
export function setUpLines(resolved: ResolvedSettings): SetUpLine[] {
	const { startHz, stopHz, centreHz, spanHz, rbwHz, vbwHz, points, preamp } = resolved;
	const tuned =
		spanHz > 0
			? `centre ${formatFrequency(centreHz)}, span ${formatFrequency(spanHz)} (${formatFrequency(startHz)} to ${formatFrequency(stopHz)})`
			: `centre ${formatFrequency(centreHz)}, span 0`;
	return [
		{ label: 'Tune', text: tuned },
		{
			label: 'Resolve',
			text: `resolution ${formatFrequency(rbwHz)}, video ${formatFrequency(vbwHz)}, ${points} points`
		},
		{
			label: 'Level',
			text: `reference ${decibels(resolved.referenceDbm)} dBm, attenuation ${decibels(resolved.attenuationDb)} dB, preamplifier ${preamp ? 'on' : 'off'}, ${correctionWords(resolved)}`
		},
		{
			label: 'Sweep',
			text: `${seconds(resolved.sweepTimeS)}, detector ${detectorWords[resolved.detector]}, averages of ${scaleWords[resolved.scale]}`
		},
		{
			label: 'Traces',
			text: resolved.traces.map((trace, i) => `${i + 1} ${traceWords(trace).toLowerCase()}`).join(', ')
		},
		{ label: 'Input', text: inputWords(resolved) }
	];
}
