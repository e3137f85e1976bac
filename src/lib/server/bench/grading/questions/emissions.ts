/** Asks for a table of emissions: every true one with its frequency and level, and nothing that isn't one. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenEmissions } from '$lib/schemas/questions/emissions';
import type { EmissionsAnswer } from '$lib/server/bench/exercise/attempt-record';
import { parseExpression } from '$lib/server/bench/exercise/expression';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { holds, isTrue } from '$lib/server/bench/exercise/truthful';
import { parseQuantity } from '$lib/units/parse-quantity';
import { checkEmissions, checkRows } from './emissions/check';
import { fillEmissions } from './emissions/fill';
import { judgeEmissions } from './emissions/judge';
import { wrongTables } from './emissions/wrong-tables';
import type { QuestionType, Read } from './question-type';

export const emissions: QuestionType<'emissions'> = {
	check: checkEmissions,
	checkAnswer: checkRows,
	fill: fillEmissions,
	fillAnswer(step, { asksBreaks }, scope, field) {
		const rows = (step.rows ?? []).filter((row) => holds(row.when, scope));
		return {
			gives: ({ values }) => {
				const known = { ...scope, ...values };
				return {
					rows: rows.map((row, i) => ({
						atHz: parseExpression(row.atHz, `${field}.rows[${i}].atHz`).evaluate(known),
						levelDbm: parseExpression(row.levelDbm, `${field}.rows[${i}].levelDbm`).evaluate(known),
						breaks: asksBreaks ? isTrue(row.breaks ?? false, known, `${field}.rows[${i}].breaks`) : null
					}))
				};
			}
		};
	},
	read: readEmissions,
	words: (_, given) =>
		(given as EmissionsAnswer).rows
			.map(({ atHz, levelDbm }) => `${quantityText(atHz, 'Hz')} at ${quantityText(levelDbm, 'dBm')}`)
			.join(', '),
	judge: judgeEmissions,
	wrongWays: (_, question) => wrongTables(question)
};

function readEmissions({ emissions: asked }: WrittenEmissions, typed: TypedAs<'emissions'>): Read {
	const asksBreaks = asked[0].breaks !== undefined;
	const issues: { field: string; message: string }[] = [];
	const rows = typed.rows.flatMap(({ frequency, level, breaks }, i) => {
		if (frequency.text.trim() === '' && level.text.trim() === '') return [];
		const at = parseQuantity(frequency.text, 'frequency', frequency.unit);
		const of = parseQuantity(level.text, 'level', level.unit);
		const refuse = (field: string, message: string) =>
			issues.push({ field: `rows.${i}.${field}`, message: `Row ${i + 1}: ${message}` });
		if (!at.ok) refuse('frequency', at.message);
		if (!of.ok) refuse('level', of.message);
		if (asksBreaks && breaks === null) refuse('breaks', 'say whether it keeps its limit.');
		return at.ok && of.ok ? [{ atHz: at.value, levelDbm: of.value, breaks: asksBreaks ? breaks : null }] : [];
	});
	if (issues.length > 0) return { issues };
	return rows.length === 0 ? null : { given: { rows } };
}
