import type { Finding } from '$lib/schemas/finding';
import type { AttemptRecord } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { doneRight } from './done-right';
import { logSteps } from './log-steps';
import { judge } from './questions/registry';

/**
 * What an attempt is worth, question by question, and what was done wrong in the learner's own numbers.
 * Pure: the same draw and record always get the same finding.
 */
export function gradeAnswer({ drawn, ...record }: { drawn: DrawnExercise } & AttemptRecord): Finding {
	const judged = drawn.questions.map((question) => judge(drawn, question, record));
	const questions = judged.map(({ finding }) => finding);
	return {
		questions,
		log: logSteps(
			drawn,
			record,
			judged.flatMap(({ blames }) => blames)
		),
		doneRight: doneRight(drawn),
		passed: questions.every(({ verdict }) => verdict.startsWith('right'))
	};
}
