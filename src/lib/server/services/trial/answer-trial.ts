import type { TrialAnswerRequest, TrialFinding } from '$lib/schemas/trial';
import { numberQuestions } from '$lib/server/bench/exercise/drawn-exercise';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { explainQuestion } from '$lib/server/bench/grading/question-finding';
import { trialRecord } from '$lib/server/bench/trial/trial-record';
import { DomainError } from '$lib/server/errors';
import { parseAnswers } from '../attempts/parse-answers';
import { trialAnswers } from './trial-limits';
import { openTrialBench, sweepTrial } from './trial-bench';

/**
 * What a visitor's number is worth, from the same grader as everybody's. The markers are read on the server's own sweep.
 * @throws DomainError `invalid` naming the answer that can't be read; `conflict`; `too_many`
 */
export async function answerTrial(
	request: TrialAnswerRequest,
	address: string,
	now: Date
): Promise<TrialFinding> {
	trialAnswers.spend(address, now);
	const { token, looks, row, fromHz, toHz, text, unit } = request;
	const bench = await openTrialBench(token, now);
	const { drawn } = bench;
	const id = drawn.exercise.trial!.question;
	const given = parseAnswers(drawn.exercise.questions, { [id]: { type: 'number', text, unit } })[id];
	const question = numberQuestions(drawn).find((asked) => asked.id === id)!;
	if (!given || !('value' in given)) {
		const issues = [{ field: `answers.${id}.text`, message: 'Give a number with its unit.' }];
		throw new DomainError('invalid', 'There is nothing to hand in yet.', { issues });
	}
	const levelsDbm = sweepTrial(bench, looks[looks.length - 1].choice, row);
	const record = trialRecord(drawn, { looks, levelsDbm, fromHz, toHz, value: given.value });
	const judgement = judgeQuestion(drawn, question, record);
	const { finding } = explainQuestion(judgement, record.log);
	const { verdict, title, yours, difference, mistakes, remarks } = finding;
	return {
		verdict,
		title,
		yours,
		true: finding.true,
		difference,
		mistakes,
		// A wrong number's reason is its mistake; what else may be said of the markers would only stand in its way.
		remarks: verdict === 'wrong' ? [] : remarks.map((remark) => remark.text)
	};
}
