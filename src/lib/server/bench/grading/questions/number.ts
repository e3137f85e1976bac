/** Asks for a number with its unit. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenNumber } from '$lib/schemas/questions/number';
import type { NumberAnswer } from '$lib/server/bench/exercise/attempt-record';
import { parseExpression } from '$lib/server/bench/exercise/expression';
import { dimensionOf } from '$lib/units/dimension';
import { parseQuantity } from '$lib/units/parse-quantity';
import { judgeQuestion } from '../judge-question';
import { explainQuestion } from '../question-finding';
import { said } from '../said';
import { blamesOf } from './number/blames';
import { checkNumber } from './number/check';
import { fillNumber } from './number/fill';
import { stepFields } from './step-fields';
import type { QuestionType, Read } from './question-type';

export const number: QuestionType<'number'> = {
	check: checkNumber,
	checkAnswer: (step, _, field) => stepFields(step, ['value', 'reading'], field),
	fill: fillNumber,
	fillAnswer(step, _, scope, field) {
		const value = parseExpression(step.value ?? '', `${field}.value`);
		return { value: (readings) => value.evaluate({ ...scope, ...readings }), reading: step.reading ?? '' };
	},
	read: readNumber,
	words: (question, given) => said((given as NumberAnswer).value, question),
	judge(drawn, question, record) {
		const judgement = judgeQuestion(drawn, question, record);
		const explained = explainQuestion(judgement, record.log);
		return { finding: explained.finding, blames: blamesOf(judgement, explained) };
	},
	// `proof/prove-number.ts` makes them: their outcomes are numbers, and must lie apart.
	wrongWays: () => []
};

function readNumber({ id, unit }: WrittenNumber, typed: TypedAs<'number'>): Read {
	if (typed.text.trim() === '') return null;
	const dimension = dimensionOf(unit);
	if (!dimension) throw new Error(`Question ${id} asks for ${unit}, which nobody can type`);
	if (dimensionOf(typed.unit) !== dimension) {
		return { issues: [{ field: 'unit', message: `${typed.unit} is no unit for an answer in ${unit}.` }] };
	}
	const parsed = parseQuantity(typed.text, dimension, typed.unit);
	if (!parsed.ok) return { issues: [{ field: 'text', message: parsed.message }] };
	return { given: { value: parsed.value, readingId: typed.readingId?.toString() } };
}
