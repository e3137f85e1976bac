/** Quantities as shown: a true minus, fixed decimals, a thin space every three decimals of a frequency. */

/** Narrow, and a figure never breaks at it. */
const THIN_SPACE = '\u202f';
const NO_BREAK_SPACE = '\u00a0';

/** A figure and its unit, apart, because the unit is set smaller. */
export interface Shown {
	figure: string;
	unit: string;
}

/** `value` with exactly `digits` decimals and a true minus; zero has no sign. */
export function formatFigure(value: number, digits: number): string {
	const fixed = value.toFixed(digits);
	return Number(fixed) === 0 ? fixed.replace('-', '') : fixed.replace('-', '−');
}

/** Figure and unit on one line that doesn't break: “−47.20 dBm”. */
export const formatQuantity = (value: number, unit: string, { digits }: { digits: number }): string =>
	joinShown({ figure: formatFigure(value, digits), unit: unit === '1' ? '' : unit });

export const joinShown = ({ figure, unit }: Shown): string =>
	unit ? figure + NO_BREAK_SPACE + unit : figure;

interface Scaled {
	unit: string;
	factor: number;
	/** Decimals that come to one base unit (Hz) or to a nanosecond. */
	decimals: number;
}
const FREQUENCIES: Scaled[] = [
	{ unit: 'GHz', factor: 1e9, decimals: 9 },
	{ unit: 'MHz', factor: 1e6, decimals: 6 },
	{ unit: 'kHz', factor: 1e3, decimals: 3 },
	{ unit: 'Hz', factor: 1, decimals: 0 }
];
const TIMES: Scaled[] = [
	{ unit: 's', factor: 1, decimals: 9 },
	{ unit: 'ms', factor: 1e-3, decimals: 6 },
	{ unit: 'µs', factor: 1e-6, decimals: 3 },
	{ unit: 'ns', factor: 1e-9, decimals: 0 }
];

/**
 * A frequency in the largest unit that leaves a whole digit: 1 234 567 Hz is 1.234 567 MHz.
 * @param digits decimals in that unit; absent: as many as the value needs, down to 1 Hz
 */
export const showFrequency = (frequencyHz: number, digits?: number): Shown =>
	show(frequencyHz, FREQUENCIES, digits);
/** A time in the largest unit that leaves a whole digit. @param digits as for a frequency, down to 1 ns */
export const showTime = (timeS: number, digits?: number): Shown => show(timeS, TIMES, digits);

/**
 * A value in base units to a given digit, in the unit that suits it: 12 345 Hz to −1 digits is 12.35 kHz.
 * @param digits decimals of the base unit; below 0: tens, hundreds … of it
 */
export function showMeasured(value: number, unit: string, digits: number): Shown {
	const scales = unit === 'Hz' ? FREQUENCIES : unit === 's' ? TIMES : undefined;
	if (!scales) return { figure: formatFigure(value, Math.max(0, digits)), unit: unit === '1' ? '' : unit };
	const steps = Math.round(Math.log10(scaleOf(value, scales).factor));
	return show(value, scales, Math.max(0, digits + steps));
}

export const formatFrequency = (frequencyHz: number, digits?: number): string =>
	joinShown(showFrequency(frequencyHz, digits));
export const formatTime = (timeS: number, digits?: number): string => joinShown(showTime(timeS, digits));

function show(value: number, scales: Scaled[], digits?: number): Shown {
	const scale = scaleOf(value, scales);
	const figure = formatFigure(value / scale.factor, digits ?? scale.decimals);
	return { figure: groupDecimals(digits === undefined ? trimZeros(figure) : figure), unit: scale.unit };
}

function scaleOf(value: number, scales: Scaled[]): Scaled {
	const smallest = scales[scales.length - 1];
	// Half a last digit of leeway, so that 999 999.999 999 9 Hz is 1 MHz and not 1000.000 kHz.
	const size = Math.abs(value) + smallest.factor / 2;
	if (value === 0) return scales.find((s) => s.factor === 1)!;
	return scales.find((s) => size >= s.factor) ?? smallest;
}

const trimZeros = (figure: string): string => (figure.includes('.') ? figure.replace(/\.?0+$/, '') : figure);

function groupDecimals(figure: string): string {
	const [whole, decimals] = figure.split('.');
	return decimals ? `${whole}.${decimals.replace(/(\d{3})(?=\d)/g, `$1${THIN_SPACE}`)}` : whole;
}
