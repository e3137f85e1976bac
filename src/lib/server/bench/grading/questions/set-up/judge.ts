import type { FindingMistake, Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, SetUpAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnCondition, DrawnExercise, SetUpQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';
import { heldBy, type Held } from './held-by';
import { setUpAt } from './set-up-at';

/** Right when the set-up handed in, which must have swept, holds every condition. */
export function judgeSetUp(drawn: DrawnExercise, question: SetUpQuestion, record: AttemptRecord): Judged {
	const answer = record.answers[question.id] as SetUpAnswer | undefined;
	const setUp = answer ? setUpAt(drawn, record, answer.entry) : null;
	const held = setUp ? heldBy(question.conditions, setUp) : [];
	const broken = held.filter(({ met }) => !met);
	const verdict: Verdict = !setUp ? 'unanswered' : broken.length > 0 ? 'wrong' : 'right';
	return {
		finding: {
			type: 'set-up',
			id: question.id,
			text: question.text,
			verdict,
			title: titleOf(verdict, broken, question.conditions.length),
			answer: setUp && answer ? `set-up ${answer.entry + 1}` : null,
			mistakes: broken.map((one) => mistakeOf(one, question.conditions)),
			remarks: [],
			plot: sweptPlot(drawn, record.log, setUp ? answer?.entry : undefined),
			conditions: held.map(({ asked, found, met }) => ({ asked, found, met }))
		},
		blames: broken.map(({ asked, found }) => ({
			entry: answer?.entry,
			text: `Here: ${found}; asked was ${asked}`
		}))
	};
}

function mistakeOf({ id, asked, found }: Held, conditions: readonly DrawnCondition[]): FindingMistake {
	const broken = conditions.find((condition) => condition.id === id)?.broken;
	return {
		kind: id,
		title: broken?.title ?? `${asked[0].toUpperCase()}${asked.slice(1)}`,
		text: broken?.text ?? 'This was asked of the set-up, and it is otherwise.',
		sum: `${found}; asked: ${asked}`
	};
}

function titleOf(verdict: Verdict, broken: readonly Held[], conditions: number): string {
	if (verdict === 'unanswered') return 'You handed in no set-up that swept.';
	if (verdict === 'right') return 'The set-up does what was asked.';
	if (broken.length === 1) return `The set-up misses one thing: ${broken[0].asked}.`;
	return `The set-up misses ${broken.length} of ${conditions} things asked.`;
}
