import { formatFrequency } from '$lib/units/format-quantity';
import { figure, shortFigure } from '../exercise/figure';
import type { NumberQuestion } from '../exercise/drawn-exercise';

/** A width to a hundredth of its leading unit: 11 030.7 Hz is “11.03 kHz”. */
export const widthText = (hz: number): string => {
	const step = 10 ** (Math.floor(Math.log10(Math.max(1, Math.abs(hz)))) - 3);
	return formatFrequency(Math.round(hz / step) * step);
};

/** How a width that a question asks for is cut off: “99 % of the power”, “26 dB under the top”. */
export function cutText({ quantity }: Pick<NumberQuestion, 'quantity'>): string {
	if (quantity.kind === 'occupied-bandwidth') return `${shortFigure(quantity.percent, 2)} % of the power`;
	if (quantity.kind === 'x-db-bandwidth') return `${shortFigure(quantity.db, 2)} dB under the top`;
	return 'the width asked';
}

/** How much wider or narrower than the truth, in words: “26 % too wide”. */
export function wideText(yours: number, truth: number): string {
	const percent = figure(Math.abs(100 * (yours / truth - 1)), 0);
	return `${percent} % too ${yours > truth ? 'wide' : 'narrow'}`;
}
