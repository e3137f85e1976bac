/** How the bench writes quantities: figure and unit apart, columns of frequencies on one unit, spreads to a fitting digit. */
import { formatFigure, showFrequency, showTime, type Shown } from '$lib/units/format-quantity';

const thinSpace = '\u202f';
const frequencySizes = { GHz: 1e9, MHz: 1e6, kHz: 1e3, Hz: 1 };
export type FrequencyUnit = keyof typeof frequencySizes;

/** The unit that a column of frequencies up to `largestHz` stands in, and its decimals down to one step of `stepHz`. */
export function frequencyColumn(
	largestHz: number,
	stepHz: number
): { unit: FrequencyUnit; decimals: number } {
	const { unit } = showFrequency(largestHz);
	const size = frequencySizes[unit as FrequencyUnit];
	const decimals = Math.max(0, Math.ceil(-Math.log10(stepHz / size)));
	return { unit: unit as FrequencyUnit, decimals: Math.min(9, Math.ceil(decimals / 3) * 3) };
}

/** A frequency in a column's unit, its decimals in threes; with `plus`, a sign on rising differences too. */
export function frequencyFigure(
	frequencyHz: number,
	column: { unit: FrequencyUnit; decimals: number },
	plus = false
): string {
	const [whole, decimals = ''] = formatFigure(
		frequencyHz / frequencySizes[column.unit],
		column.decimals
	).split('.');
	const grouped = decimals.replace(/(\d{3})(?=\d)/g, `$1${thinSpace}`);
	return `${plus && frequencyHz > 0 ? '+' : ''}${whole}${grouped && `.${grouped}`}`;
}

/**
 * A reading's value: frequencies and times in the unit that suits them, levels and ratios with one decimal.
 * @param spreadHz of a counted frequency, which is shown down to a digit of its spread
 */
export function shownReading(value: number, unit: string, spreadHz?: number): Shown {
	if (unit === 'Hz' && spreadHz) {
		const { unit: column } = frequencyColumn(value, 1);
		const decimals = Math.ceil(Math.log10(frequencySizes[column] / spreadHz));
		return {
			figure: frequencyFigure(value, { unit: column, decimals: Math.min(12, Math.max(0, decimals)) }),
			unit: column
		};
	}
	if (unit === 'Hz') return showFrequency(value, value < 1000 ? 1 : 3);
	if (unit === 's') return showTime(value, 3);
	if (unit === '1') return { figure: formatFigure(value, 2), unit: '' };
	return { figure: formatFigure(value, 1), unit };
}

/** One standard deviation beside a value, in the value's unit and to a digit that says something: "±0.2"; '' for none. */
export function shownSpread(spread: number, value: number, unit: string): string {
	if (!(spread > 0)) return '';
	const size =
		unit === 'Hz' || unit === 's'
			? value / Number(shownReading(value, unit).figure.replace(/[^\d.]/g, ''))
			: 1;
	const scaled = spread / size;
	return `±${formatFigure(scaled, spreadDigits(scaled))}`;
}

/** Decimals down to the first digit that says something. */
export const spreadDigits = (spread: number): number =>
	spread >= 9.5 ? 0 : Math.min(4, Math.max(1, Math.ceil(-Math.log10(spread) - 0.02)));

/** A setting's value in the unit that suits it, as short as it can be. */
export function shownSetting(value: number, base: 'Hz' | 's' | 'dBm' | 'dB' | ''): Shown {
	if (base === 'Hz') return showFrequency(value);
	if (base === 's') return showTime(Number(value.toPrecision(3)));
	if (base === '') return { figure: String(value), unit: '' };
	return { figure: formatFigure(value, Number.isInteger(value) ? 0 : 1), unit: base };
}

/** Receiver time as people say it: 372 s is 6 min 12 s. */
export function clockParts(seconds: number): { minutes: number; seconds: number } {
	const whole = Math.floor(seconds + 1e-9);
	return { minutes: Math.floor(whole / 60), seconds: whole % 60 };
}
