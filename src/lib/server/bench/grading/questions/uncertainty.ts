/** Asks for a value with its expanded uncertainty and coverage factor. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenUncertainty } from '$lib/schemas/questions/uncertainty';
import type { UncertaintyAnswer } from '$lib/server/bench/exercise/attempt-record';
import { parseExpression } from '$lib/server/bench/exercise/expression';
import { shortFigure } from '$lib/server/bench/exercise/figure';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { dimensionOf } from '$lib/units/dimension';
import { parseNumber } from '$lib/units/parse-number';
import { parseQuantity } from '$lib/units/parse-quantity';
import type { QuestionType, Read } from './question-type';
import { stepFields } from './step-fields';
import { checkUncertainty } from './uncertainty/check';
import { fillUncertainty } from './uncertainty/fill';
import { judgeUncertainty } from './uncertainty/judge';
import { wrongBudgets } from './uncertainty/wrong-budgets';

export const uncertainty: QuestionType<'uncertainty'> = {
	check: checkUncertainty,
	checkAnswer: (step, _, field) => stepFields(step, ['value', 'reading', 'expandedDb', 'k'], field),
	fill: fillUncertainty,
	fillAnswer(step, _, scope, field) {
		const value = parseExpression(step.value ?? '', `${field}.value`);
		const expanded = parseExpression(step.expandedDb ?? '', `${field}.expandedDb`);
		return {
			gives: ({ values, taken }) => {
				const known = { ...scope, ...values };
				return {
					stated: value.evaluate(known),
					expandedDb: expanded.evaluate(known),
					k: step.k ?? 2,
					readingId: taken.get(step.reading ?? '')?.id
				};
			}
		};
	},
	read: readUncertainty,
	words: ({ unit, digits }, given) => {
		const { stated, expandedDb, k } = given as UncertaintyAnswer;
		return `${quantityText(stated, unit, digits)} ± ${shortFigure(expandedDb, 2)} dB, k = ${shortFigure(k, 2)}`;
	},
	judge: judgeUncertainty,
	wrongWays: (_, question) => wrongBudgets(question)
};

function readUncertainty({ unit }: WrittenUncertainty, typed: TypedAs<'uncertainty'>): Read {
	const texts = [typed.value.text, typed.expanded, typed.k];
	if (texts.every((text) => text.trim() === '')) return null;
	const issues: { field: string; message: string }[] = [];
	const dimension = dimensionOf(unit);
	if (!dimension) throw new Error(`Nobody can type ${unit}`);
	const value = parseQuantity(typed.value.text, dimension, typed.value.unit);
	if (!value.ok) issues.push({ field: 'value', message: `Value: ${value.message}` });
	const expanded = numberOf(typed.expanded, 'dB');
	if (!(expanded > 0)) issues.push({ field: 'expanded', message: 'Uncertainty: give decibels, above 0.' });
	const k = numberOf(typed.k, '');
	if (!(k >= 1 && k <= 4))
		issues.push({ field: 'k', message: 'Coverage factor: give a number from 1 to 4.' });
	if (issues.length > 0 || !value.ok) return { issues };
	return { given: { stated: value.value, expandedDb: expanded, k, readingId: typed.readingId?.toString() } };
}

/** A number with nothing behind it but its unit; NaN for anything else. */
function numberOf(text: string, unit: string): number {
	const parsed = parseNumber(text);
	return parsed.ok && ['', unit].includes(parsed.rest) ? parsed.value : NaN;
}
