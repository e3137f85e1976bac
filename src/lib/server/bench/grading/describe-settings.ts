import type { Settings, TraceSettings } from '$lib/schemas/settings';
import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import { shortFigure } from '../exercise/figure';

type Describe = (settings: Settings) => string | undefined;
const hertz = (value: number | 'auto' | undefined): string =>
	value === undefined || value === 'auto' ? 'auto' : formatFrequency(value);
const decibels = (value: number | 'auto' | undefined, unit: string): string =>
	value === undefined || value === 'auto' ? 'auto' : `${shortFigure(value, 2)} ${unit}`;

function correction({ correctionDb }: Settings): string {
	if (Array.isArray(correctionDb)) return `correction from a table of ${correctionDb.length} points`;
	return `correction ${shortFigure(correctionDb ?? 0, 2)} dB`;
}

const MODES: Record<TraceSettings['mode'], string> = {
	live: 'live',
	average: 'average',
	'max-hold': 'hold maximum',
	'min-hold': 'hold minimum',
	kept: 'kept'
};
const traces = ({ traces: shown }: Settings): string =>
	(shown ?? [{ mode: 'live' as const }])
		.map(({ mode, count }, i) => {
			const of = mode === 'average' ? ` of ${count ?? 100}` : '';
			return `trace ${i + 1} ${MODES[mode]}${of}`;
		})
		.join(', ');

function input({ input: connection }: Settings): string {
	const pad = connection?.padDb ? `${connection.padDb} dB pad` : 'no pad';
	const block = connection?.dcBlock ? 'DC block' : 'no DC block';
	return connection?.connected === false ? 'matched load on the input' : `connected, ${pad}, ${block}`;
}

/** The set-up in words, one phrase an entry; a phrase that reads as before is left out of a change. */
const PHRASES: Describe[] = [
	({ centreHz }) => (centreHz === undefined ? undefined : `centre ${hertz(centreHz)}`),
	({ spanHz }) => (spanHz === undefined ? undefined : `span ${hertz(spanHz)}`),
	({ startHz }) => (startHz === undefined ? undefined : `start ${hertz(startHz)}`),
	({ stopHz }) => (stopHz === undefined ? undefined : `stop ${hertz(stopHz)}`),
	({ rbwHz }) => `resolution ${hertz(rbwHz)}`,
	({ vbwHz }) => `video ${hertz(vbwHz)}`,
	({ points }) => `${points ?? 1001} points`,
	({ referenceDbm }) => `reference ${decibels(referenceDbm ?? 0, 'dBm')}`,
	({ attenuationDb }) => `attenuation ${decibels(attenuationDb, 'dB')}`,
	({ preamp }) => `preamplifier ${preamp ? 'on' : 'off'}`,
	correction,
	({ sweepTimeS }) => `sweep time ${typeof sweepTimeS === 'number' ? formatTime(sweepTimeS) : 'auto'}`,
	({ detector }) => `detector ${(detector ?? 'auto').replace('-', ' ')}`,
	({ scale }) => `averages on ${scale === 'power' || scale === 'voltage' ? scale : 'decibels'}`,
	traces,
	input
];
const ORDINARY: Settings = {};
/** What is said of a set-up that was there before. */
export const SAME = 'Swept again';

/** What changed from one set-up to the next, in words: "Centre 450 MHz, span 100 kHz". From nothing: all that isn't ordinary. */
export function describeSettings(before: Settings | undefined, after: Settings): string {
	const from = before ?? ORDINARY;
	const changed = PHRASES.map((phrase) => [phrase(from), phrase(after)] as const)
		.filter(([was, is]) => is !== undefined && is !== was)
		.map(([, is]) => is as string);
	const sentence = changed.join(', ');
	return sentence ? sentence[0].toUpperCase() + sentence.slice(1) : SAME;
}
