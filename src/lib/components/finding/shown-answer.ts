/** Answers as a finding writes them: to the digit that matters, frequencies and times in the unit that suits them. */
import { showMeasured, type Shown } from '$lib/units/format-quantity';
import type { NumberFinding } from '$lib/schemas/questions/finding';

export const shownAnswer = ({
	value,
	unit,
	digits
}: {
	value: number;
	unit: string;
	digits: number;
}): Shown => showMeasured(value, unit, digits);

/** The unit that a difference of two such answers has: dB between levels. */
export const differenceUnit = (unit: string): string => (unit.startsWith('dB') ? 'dB' : unit);

/** How far apart two numbers of a finding are, with a plus where there is one: one digit finer than the answer is shown. */
export function shownChange(change: number, { true: truth }: Pick<NumberFinding, 'true'>): Shown {
	const shown = showMeasured(change, differenceUnit(truth.unit), changeDigits(truth));
	return { ...shown, figure: change > 0 ? `+${shown.figure}` : shown.figure };
}

/** Decimals of a difference: at least one of what is in decibels or without a unit. */
export const changeDigits = ({ unit, digits }: NumberFinding['true']): number =>
	unit === 'Hz' || unit === 's' ? digits : Math.max(1, digits);
