/** Answers as a finding writes them: to the digits asked, frequencies in the unit that suits them. */
import { formatFigure, showFrequency, showTime, type Shown } from '$lib/units/format-quantity';

export function shownAnswer({ value, unit, digits }: { value: number; unit: string; digits: number }): Shown {
	if (unit === 'Hz') return showFrequency(value, Math.abs(value) < 1000 ? digits : Math.max(1, digits));
	if (unit === 's') return showTime(value, Math.max(1, digits));
	return { figure: formatFigure(value, digits), unit: unit === '1' ? '' : unit };
}

/** The unit that a difference of two such answers has: dB between levels. */
export const differenceUnit = (unit: string): string => (unit.startsWith('dB') ? 'dB' : unit);
