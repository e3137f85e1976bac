import type { Tolerance } from '$lib/schemas/questions/number';
import type { ExerciseQuestion } from '$lib/schemas/questions/question';
import type { QuestionView } from '$lib/schemas/questions/view';
import { dimensionOf, dimensionSpec } from '$lib/units/dimension';
import { formatFigure, formatFrequency, formatTime } from '$lib/units/format-quantity';

/** A question as one attempt asks it. The record holds what is right too; only what stands here goes out. */
export interface AskedQuestion {
	id: string;
	text: string;
	/** Options or items, in the order they are offered. */
	options?: { key: string; text: string }[];
	items?: { key: string; text: string }[];
}

export function presentQuestion(
	{ id, text, options = [], items = [] }: AskedQuestion,
	written: ExerciseQuestion
): QuestionView {
	switch (written.type) {
		case 'number': {
			const { unit, digits, tolerance } = written;
			const toleranceText = presentTolerance(tolerance, unit);
			return { type: 'number', id, text, unit, units: presentUnits(unit), digits, toleranceText };
		}
		case 'choice': {
			const toleranceText = written.pick === 'one' ? 'One is right' : 'One or several are right';
			const offered = options.map((option) => ({ key: option.key, text: option.text }));
			return { type: 'choice', id, text, pick: written.pick, options: offered, toleranceText };
		}
		case 'set-up':
			return { type: 'set-up', id, text, toleranceText: 'Judged by what the receiver did' };
		case 'mark': {
			const { shape, tolerance } = written;
			const within =
				'absolute' in tolerance
					? formatFrequency(tolerance.absolute)
					: `${shortest(tolerance.relative * 100)} % of the width`;
			return {
				type: 'mark',
				id,
				text,
				shape,
				toleranceText: `Right within ±${within}${shape === 'band' ? ' at each edge' : ''}`
			};
		}
		case 'order': {
			const offered = items.map(({ key, text: item }) => ({ key, text: item }));
			return {
				type: 'order',
				id,
				text,
				items: offered,
				toleranceText: 'Right when each stands in its place'
			};
		}
		case 'emissions': {
			const { toleranceHz, toleranceDb, emissions } = written;
			const toleranceText = `Right within ±${formatFrequency(toleranceHz)} and ±${shortest(toleranceDb)} dB, none missing, none invented`;
			return { type: 'emissions', id, text, asksBreaks: emissions[0].breaks !== undefined, toleranceText };
		}
		case 'uncertainty': {
			const { unit, toleranceDb, within } = written;
			const toleranceText = `Value right within ±${shortest(toleranceDb)} dB, uncertainty within ${shortest(within * 100)} % of its budget`;
			return { type: 'uncertainty', id, text, unit, units: presentUnits(unit), toleranceText };
		}
	}
}

/** Every unit that an answer asked for in `unit` may be given in, that one first. */
export function presentUnits(unit: string): string[] {
	const dimension = dimensionOf(unit);
	const others = dimension ? Object.keys(dimensionSpec(dimension).units) : [];
	return [unit, ...others.filter((other) => other !== unit)];
}

/** From what the author wrote: a share of the true value must not be worked out here, it would tell the value. */
export function presentTolerance(tolerance: Tolerance, unit: string): string {
	if ('relative' in tolerance) return `Right within ±${shortest(tolerance.relative * 100)} %`;
	const { absolute } = tolerance;
	if (unit === 'Hz') return `Right within ±${formatFrequency(absolute)}`;
	if (unit === 's') return `Right within ±${formatTime(absolute)}`;
	if (unit === '%') return `Right within ±${shortest(absolute)} percentage points`;
	return `Right within ±${shortest(absolute)}${unit === '1' ? '' : ' dB'}`;
}

const shortest = (value: number): string =>
	formatFigure(Number(value.toPrecision(6)), 6).replace(/\.?0+$/, '');
