/** A difference asked for and worked out from two markers, each read on its own. */
import { onLineHz } from './supports';
import type { Evidence, Source } from './evidence';
import { takenAtHz } from './place';
import { copyingReach } from './spreads';

/** Two markers among the readings, one on each line asked about, whose difference is `value`: in level, or in frequency where that is asked. */
export function betweenMarkers(
	{ question, taken }: Evidence,
	value: number
): { from: Source; to: Source } | undefined {
	const { quantity, unit } = question;
	if (quantity.kind !== 'delta') return undefined;
	const standingOn = (lineHz: number | undefined): Source[] =>
		taken.filter(
			(source) =>
				source.family === 'point' &&
				lineHz !== undefined &&
				Math.abs((takenAtHz(source) ?? Infinity) - lineHz) <= onLineHz(source)
		);
	// Both were rounded before they were taken from each other.
	const reach = 2 * copyingReach(question);
	for (const from of standingOn(quantity.fromHz))
		for (const to of standingOn(quantity.toHz)) {
			const apart =
				unit === 'Hz'
					? Math.abs((takenAtHz(to) ?? NaN) - (takenAtHz(from) ?? NaN))
					: to.reading.value - from.reading.value;
			const given = unit === 'Hz' ? Math.abs(value) : value;
			if (Math.abs(apart - given) <= reach) return { from, to };
		}
	return undefined;
}
