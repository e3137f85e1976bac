import type { FindingMistake, Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, ChoiceAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { ChoiceQuestion, DrawnExercise, DrawnOption } from '$lib/server/bench/exercise/drawn-exercise';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';
import { heldBy } from '../set-up/held-by';
import { setUpAt } from '../set-up/set-up-at';

/** Right when just the right options are chosen; by luck when nothing that was swept could tell. */
export function judgeChoice(drawn: DrawnExercise, question: ChoiceQuestion, record: AttemptRecord): Judged {
	const answer = record.answers[question.id] as ChoiceAnswer | undefined;
	const isChosen = ({ key }: DrawnOption) => answer?.chosen.includes(key) ?? false;
	const wrong = answer ? question.options.filter((option) => isChosen(option) !== option.right) : [];
	const missing = answer ? notLooked(drawn, question, record) : [];
	const verdict: Verdict = !answer
		? 'unanswered'
		: wrong.length > 0
			? 'wrong'
			: missing.length > 0
				? 'right-but-method'
				: 'right';
	const told = question.pick === 'one' ? wrong.filter(isChosen) : wrong;
	return {
		finding: {
			type: 'choice',
			id: question.id,
			text: question.text,
			verdict,
			title: titleOf(
				verdict,
				question,
				wrong.filter(isChosen),
				wrong.filter((option) => !isChosen(option))
			),
			answer: answer
				? question.options
						.filter(isChosen)
						.map(({ text }) => `“${text}”`)
						.join(', ')
				: null,
			mistakes: told.map((option) => mistakeOf(option, isChosen(option))),
			remarks: verdict === 'wrong' ? [] : missing.map((text, i) => ({ code: `not-looked-${i + 1}`, text })),
			plot: sweptPlot(drawn, record.log),
			pick: question.pick,
			options: question.options.map((option) => ({
				text: option.text,
				chosen: isChosen(option),
				right: option.right
			}))
		},
		blames: told.map((option) => ({
			question: question.id,
			text: isChosen(option) ? `“${option.text}” is wrong` : `“${option.text}” is left out`
		}))
	};
}

/** What would have had to be swept to know, and wasn't. */
const notLooked = (drawn: DrawnExercise, { looked }: ChoiceQuestion, record: AttemptRecord): string[] => {
	const setUps = record.log.flatMap((_, entry) => setUpAt(drawn, record, entry) ?? []);
	return looked
		.filter(({ conditions }) => !setUps.some((setUp) => heldBy(conditions, setUp).every(({ met }) => met)))
		.map(({ missing }) => missing);
};

function mistakeOf({ id, text, chosen, leftOut }: DrawnOption, isChosen: boolean): FindingMistake {
	return isChosen
		? {
				kind: `chose-${id}`,
				...(chosen ?? { title: `“${text}” is wrong`, text: 'It is none of what was asked.' })
			}
		: {
				kind: `left-out-${id}`,
				...(leftOut ?? { title: `“${text}” is left out`, text: 'It belongs to what was asked.' })
			};
}

function titleOf(
	verdict: Verdict,
	{ pick, looked }: ChoiceQuestion,
	wrong: readonly DrawnOption[],
	left: readonly DrawnOption[]
): string {
	switch (verdict) {
		case 'unanswered':
			return 'You gave no answer.';
		case 'right':
			return looked.length > 0 ? 'Right, and your sweeps can show it.' : 'Right.';
		case 'right-but-method':
			return 'The choice is right, but nothing you swept could tell.';
		case 'wrong': {
			if (pick === 'one') return `It is not “${wrong[0].text}”.`;
			const parts = [
				...(wrong.length > 0
					? [`chose ${counted(wrong.length)} that ${wrong.length === 1 ? 'doesn’t' : 'don’t'} belong`]
					: []),
				...(left.length > 0
					? [`left ${counted(left.length)} out that ${left.length === 1 ? 'does' : 'do'}`]
					: [])
			];
			return `You ${parts.join(', and ')}.`;
		}
	}
}

const counted = (count: number): string => (count === 1 ? 'one' : String(count));
