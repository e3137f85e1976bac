/** Asks to set the receiver up so that stated conditions hold: checked on what it did, not on a word. */
import type { SetUpAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { FilledStep, SetUpQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import type { QuestionType, WrongWay } from './question-type';
import { checkSetUp } from './set-up/check';
import { fillSetUp } from './set-up/fill';
import { judgeSetUp } from './set-up/judge';
import { stepFields } from './step-fields';

export const setUp: QuestionType<'set-up'> = {
	check: checkSetUp,
	checkAnswer: (step, _, field) => stepFields(step, [], field),
	fill: fillSetUp,
	fillAnswer: () => ({ gives: ({ entry }) => ({ entry }) }),
	read: (_, { setUp: number }) => (number === null ? null : { given: { entry: number } }),
	words: (_, given) => `set-up ${(given as SetUpAnswer).entry + 1}`,
	judge: judgeSetUp,
	wrongWays: (_, question) => missedWays(question)
};

/** The taught set-up with one thing set otherwise, swept as often, and handed in. */
const missedWays = (question: SetUpQuestion): WrongWay[] =>
	question.mistakes.map(({ id, settings, breaks }) => ({
		id,
		make: (steps) => {
			const sweeps = steps.findLast((step, i) => step.do === 'sweep' && i < answerOf(steps, question.id));
			return steps.flatMap((step): FilledStep[] =>
				step.do === 'answer' && step.question === question.id
					? [{ do: 'set', settings }, ...(sweeps ? [sweeps] : []), step]
					: [step]
			);
		},
		isNamed: ({ mistakes }) =>
			mistakes.length === breaks.length && mistakes.every(({ kind }) => breaks.includes(kind))
	}));

const answerOf = (steps: readonly FilledStep[], question: string): number =>
	steps.findIndex((step) => step.do === 'answer' && step.question === question);
