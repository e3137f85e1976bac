/** What the arrow keys make of a value: the next one that a person would have typed. */
import type { ReceiverView } from '$lib/schemas/exercise-view';
import type { ResolvedSettings } from '$lib/schemas/settings';

export type SteppedField =
	| 'centreHz'
	| 'spanHz'
	| 'startHz'
	| 'stopHz'
	| 'rbwHz'
	| 'vbwHz'
	| 'points'
	| 'referenceDbm'
	| 'attenuationDb'
	| 'correctionDb'
	| 'sweepTimeS';

const pointSteps = [101, 201, 501, 1001, 2001, 5001, 10001];

/** The next value above (`up`) or below in a rising list; the end of the list stays where it is. */
export function nextOf(list: readonly number[], value: number, up: boolean): number {
	const beyond = list.filter((v) => (up ? v > value * (1 + 1e-9) + 1e-12 : v < value * (1 - 1e-9) - 1e-12));
	if (beyond.length === 0) return value;
	return up ? Math.min(...beyond) : Math.max(...beyond);
}

/** The next figure of a repeating series (1-2-5, 1-3-10) above or below. @param value greater than 0 */
export function nextInSeries(value: number, series: readonly number[], up: boolean): number {
	const decade = Math.floor(Math.log10(value) + 1e-9);
	const figures = [decade - 1, decade, decade + 1].flatMap((d) => series.map((s) => Number(`${s}e${d}`)));
	return nextOf(figures, value, up);
}

const rounded = (value: number, step: number) => Number((Math.round(value / step) * step).toPrecision(12));

/**
 * The value one step on. Frequencies move by a tenth of the span, or a hundredth with `fine`; widths and times along
 * 1-2-5; what the receiver has in steps, along its own steps.
 */
export function stepValue(
	field: SteppedField,
	resolved: ResolvedSettings,
	receiver: ReceiverView,
	up: boolean,
	fine = false
): number {
	const sign = up ? 1 : -1;
	switch (field) {
		case 'centreHz':
		case 'startHz':
		case 'stopHz': {
			const step = (resolved.spanHz || resolved.rbwHz) / (fine ? 100 : 10);
			return Number((resolved[field] + sign * step).toPrecision(12));
		}
		case 'spanHz':
			return resolved.spanHz > 0 ? nextInSeries(resolved.spanHz, [1, 2, 5], up) : up ? 1000 : 0;
		case 'sweepTimeS':
			return nextInSeries(resolved.sweepTimeS, [1, 2, 5], up);
		case 'rbwHz':
			return nextOf(receiver.rbwHz, resolved.rbwHz, up);
		case 'vbwHz':
			return nextInSeries(resolved.vbwHz, [1, 3], up);
		case 'points':
			return nextOf(pointSteps, resolved.points, up);
		case 'attenuationDb':
			return nextOf(receiver.attenuatorDb, resolved.attenuationDb, up);
		case 'referenceDbm':
			return rounded(resolved.referenceDbm + sign * (fine ? 1 : 10), fine ? 1 : 5);
		case 'correctionDb': {
			const now = typeof resolved.correctionDb === 'number' ? resolved.correctionDb : 0;
			return rounded(now + sign * (fine ? 0.1 : 1), 0.1);
		}
	}
}

/** Why a value is none of the receiver's steps: the two it lies between, or the end it lies beyond. Undefined for a step. */
export function stepProblem(
	value: number,
	steps: readonly number[],
	write: (step: number) => string
): string | undefined {
	if (steps.includes(value)) return undefined;
	const below = steps.filter((step) => step < value);
	const above = steps.filter((step) => step > value);
	if (below.length === 0) return `The least this receiver has is ${write(Math.min(...above))}.`;
	if (above.length === 0) return `The most this receiver has is ${write(Math.max(...below))}.`;
	return `This receiver has ${write(Math.max(...below))} and ${write(Math.min(...above))}, nothing between.`;
}
