/** The unit a number line is drawn in: kHz, MHz, ms … where the base unit would give long figures. */
import type { FindingNumberLine } from '$lib/schemas/questions/finding';
import { showFrequency, showTime } from '$lib/units/format-quantity';

/** @returns the unit, and what its base unit's values are divided by */
export function axisScale({ unit, marks }: FindingNumberLine): { unit: string; factor: number } {
	const most = Math.max(...marks.map(({ value }) => Math.abs(value)));
	if ((unit !== 'Hz' && unit !== 's') || !(most > 0)) return { unit, factor: 1 };
	const shown = unit === 'Hz' ? showFrequency(most, 0) : showTime(most, 0);
	return { unit: shown.unit, factor: FACTORS[shown.unit] };
}

const FACTORS: Record<string, number> = {
	GHz: 1e9,
	MHz: 1e6,
	kHz: 1e3,
	Hz: 1,
	s: 1,
	ms: 1e-3,
	µs: 1e-6,
	ns: 1e-9
};
