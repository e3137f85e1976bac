/** Asks to mark a place on the plot: a frequency, or a band's two edges. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenMark } from '$lib/schemas/questions/mark';
import type { MarkAnswer } from '$lib/server/bench/exercise/attempt-record';
import { parseExpression } from '$lib/server/bench/exercise/expression';
import type { FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { displayedHz } from '../displayed';
import { checkMark } from './mark/check';
import { fillMark } from './mark/fill';
import { judgeMark } from './mark/judge';
import { placeWords } from './mark/place-words';
import type { QuestionType, Read } from './question-type';
import { stepFields } from './step-fields';

export const mark: QuestionType<'mark'> = {
	check: checkMark,
	checkAnswer: (step, { shape }, field) =>
		stepFields(step, shape === 'band' ? ['atHz', 'toHz'] : ['atHz'], field),
	fill: fillMark,
	fillAnswer(step, { shape }, scope, field) {
		const at = parseExpression(step.atHz ?? '', `${field}.atHz`);
		const to = shape === 'band' ? parseExpression(step.toHz ?? '', `${field}.toHz`) : undefined;
		return {
			gives: ({ values }) => {
				const known = { ...scope, ...values };
				return { atHz: at.evaluate(known), ...(to && { toHz: to.evaluate(known) }) };
			}
		};
	},
	read: readMark,
	words: (question, given) => placeWords(given as MarkAnswer, question.toleranceHz),
	judge: judgeMark,
	wrongWays: (drawn, { id, mistakes }) =>
		mistakes.map((mistake) => ({
			id: mistake.id,
			make: (steps) =>
				steps.map((step): FilledStep => {
					if (step.do !== 'answer' || step.question !== id) return step;
					const shown = (hz: number) => displayedHz({ drawn }, hz);
					const { atHz, toHz } = mistake;
					const given = { atHz: shown(atHz), ...(toHz !== undefined && { toHz: shown(toHz) }) };
					return { do: 'answer', question: id, gives: () => given };
				}),
			isNamed: (finding) => finding.mistakes.length === 1 && finding.mistakes[0].kind === mistake.id
		}))
};

function readMark({ shape }: WrittenMark, { atHz, toHz }: TypedAs<'mark'>): Read {
	if (atHz === null && (toHz ?? null) === null) return null;
	if (shape === 'flag') {
		if (atHz === null) return null;
		return { given: { atHz } };
	}
	if (atHz === null || toHz === null || toHz === undefined || atHz === toHz) {
		return { issues: [{ field: atHz === null ? 'atHz' : 'toHz', message: 'Mark both edges of the band.' }] };
	}
	return { given: { atHz: Math.min(atHz, toHz), toHz: Math.max(atHz, toHz) } };
}
