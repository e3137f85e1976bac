/** A set-up as the strip groups it, for looking at: each value as a figure, and whether the step before had another. */
import { formatFigure, showFrequency, showTime, type Shown } from '$lib/units/format-quantity';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { detectorWords, scaleWords, traceWords } from '../bench/setup/setup-words';

export interface ShownValue extends Shown {
	label: string;
	/** Automatic coupling chose it. */
	auto: boolean;
	changed: boolean;
}
export interface ShownGroup {
	title: string;
	values: ShownValue[];
}

type Write = (resolved: ResolvedSettings) => Shown;
const word = (figure: string): Shown => ({ figure, unit: '' });
const decibels = (value: number, unit: string): Shown => ({
	figure: formatFigure(value, Number.isInteger(value) ? 0 : 1),
	unit
});

const groups: {
	title: string;
	values: { label: string; write: Write; auto?: keyof ResolvedSettings['auto'] }[];
}[] = [
	{
		title: 'Tune',
		values: [
			{ label: 'Centre', write: ({ centreHz }) => showFrequency(centreHz) },
			{ label: 'Span', write: ({ spanHz }) => showFrequency(spanHz) },
			{ label: 'Start', write: ({ startHz }) => showFrequency(startHz) },
			{ label: 'Stop', write: ({ stopHz }) => showFrequency(stopHz) }
		]
	},
	{
		title: 'Resolve',
		values: [
			{ label: 'Resolution', write: ({ rbwHz }) => showFrequency(rbwHz), auto: 'rbwHz' },
			{ label: 'Video', write: ({ vbwHz }) => showFrequency(vbwHz), auto: 'vbwHz' },
			{ label: 'Points', write: ({ points }) => word(String(points)) }
		]
	},
	{
		title: 'Level',
		values: [
			{ label: 'Reference', write: ({ referenceDbm }) => decibels(referenceDbm, 'dBm') },
			{
				label: 'Attenuation',
				write: ({ attenuationDb }) => decibels(attenuationDb, 'dB'),
				auto: 'attenuationDb'
			},
			{ label: 'Preamplifier', write: ({ preamp }) => word(preamp ? 'on' : 'off') },
			{
				label: 'Correction',
				write: ({ correctionDb }) =>
					typeof correctionDb === 'number'
						? decibels(correctionDb, 'dB')
						: word(`table of ${correctionDb.length}`)
			},
			{
				label: 'Input',
				write: ({ input }) =>
					word(
						!input.connected
							? 'matched load'
							: [
									input.padDb ? `${input.padDb} dB pad` : 'no pad',
									...(input.dcBlock ? ['DC block'] : [])
								].join(', ')
					)
			}
		]
	},
	{
		title: 'Sweep',
		values: [
			{
				label: 'Time',
				write: ({ sweepTimeS }) => showTime(Number(sweepTimeS.toPrecision(3))),
				auto: 'sweepTimeS'
			},
			{ label: 'Detector', write: ({ detector }) => word(detectorWords[detector]), auto: 'detector' },
			{ label: 'Averages', write: ({ scale }) => word(scaleWords[scale]) }
		]
	}
];

/** The set-up after a step beside the one before it. */
export function shownSetUp(before: ResolvedSettings, after: ResolvedSettings): ShownGroup[] {
	const differs = (write: Write) => JSON.stringify(write(before)) !== JSON.stringify(write(after));
	return [
		...groups.map(({ title, values }) => ({
			title,
			values: values.map(({ label, write, auto }) => ({
				label,
				...write(after),
				auto: auto !== undefined && after.auto[auto],
				changed: differs(write)
			}))
		})),
		{
			title: 'Traces',
			values: after.traces.map((trace, i) => ({
				label: String(i + 1),
				...word(traceWords(trace)),
				auto: false,
				changed: !before.traces[i] || traceWords(before.traces[i]) !== traceWords(trace)
			}))
		}
	];
}
