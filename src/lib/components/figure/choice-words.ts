/** A control's choices in words: on its rule, in the legend, and for the reader. */
import type { ControlSetting, FigureChoice, FigureControl } from '$lib/schemas/figure';
import type { Detector, Scale, TraceMode } from '$lib/schemas/settings';
import { formatFigure, joinShown, showFrequency, showTime, type Shown } from '$lib/units/format-quantity';
import { detectorWords, modeWords, scaleWords } from '../bench/setup/setup-words';

const switches: Partial<Record<ControlSetting, [off: string, on: string]>> = {
	preamp: ['off', 'on'],
	dcBlock: ['none', 'fitted'],
	connected: ['matched load', 'signal']
};

const levelUnits: Partial<Record<ControlSetting, string>> = {
	referenceDbm: 'dBm',
	attenuationDb: 'dB',
	correctionDb: 'dB',
	padDb: 'dB'
};

function numberWords(setting: ControlSetting, value: number): Shown {
	if (setting.endsWith('Hz')) return showFrequency(value);
	if (setting === 'sweepTimeS') return showTime(value);
	const digits = Number.isInteger(value) ? 0 : Math.min(2, String(value).split('.')[1]?.length ?? 0);
	return { figure: formatFigure(value, digits), unit: levelUnits[setting] ?? '' };
}

/** A choice as figure and unit; a word is a figure without a unit. */
export function choiceShown(setting: ControlSetting, choice: FigureChoice): Shown {
	if (typeof choice === 'number') return numberWords(setting, choice);
	if (typeof choice === 'boolean') {
		const [off, on] = switches[setting] ?? ['no', 'yes'];
		return { figure: choice ? on : off, unit: '' };
	}
	const words =
		setting === 'detector'
			? detectorWords[choice as Detector]
			: setting === 'scale'
				? scaleWords[choice as Scale]
				: setting === 'traceMode'
					? modeWords[choice as TraceMode].toLowerCase()
					: undefined;
	return { figure: words ?? choice, unit: '' };
}

/** Whether a choice is set in the face of figures. */
export const isNumber = (choice: FigureChoice): boolean => typeof choice === 'number';

/** All controls at once, as the legend tells one state from another: "300 Hz, hold maximum". */
export const stateWords = (controls: readonly FigureControl[], values: readonly FigureChoice[]): string =>
	controls.map(({ setting }, i) => joinShown(choiceShown(setting, values[i]))).join(', ');
