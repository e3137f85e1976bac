import type { Finding } from '$lib/schemas/finding';
import type { AttemptRecord } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { doneRight } from './done-right';
import { judgeQuestion } from './judge-question';
import { logSteps } from './log-steps';
import { explainQuestion } from './question-finding';

/**
 * What an attempt is worth, question by question, and what was done wrong in the learner's own numbers.
 * Pure: the same draw and record always get the same finding.
 */
export function gradeAnswer({ drawn, ...record }: { drawn: DrawnExercise } & AttemptRecord): Finding {
	const judged = drawn.questions.map((question) => {
		const judgement = judgeQuestion(drawn, question, record);
		return { judgement, explained: explainQuestion(judgement, record.log) };
	});
	return {
		questions: judged.map(({ explained }) => explained.finding),
		log: logSteps(drawn, record, judged),
		doneRight: doneRight(drawn),
		passed: judged.every(({ judgement }) => judgement.verdict.startsWith('right'))
	};
}
