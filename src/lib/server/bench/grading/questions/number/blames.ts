import type { Judgement } from '$lib/server/bench/grading/judge-question';
import type { ExplainedQuestion } from '$lib/server/bench/grading/question-finding';
import type { Blame } from '../question-type';

/** Which step of the log each mistake belongs to. A set-up or reading nobody recorded leaves the answer to blame. */
export function blamesOf({ evidence, matched }: Judgement, { accounts }: ExplainedQuestion): Blame[] {
	const question = evidence.question.id;
	const source = matched?.source;
	return accounts.flatMap(({ explanation }): Blame[] => {
		if (!explanation) return [];
		const { at, text } = explanation.bad;
		if (at === 'set-up' && source) return [{ entry: source.entry, text }];
		if (at === 'reading' && source) return [{ reading: source.id, text }];
		return [{ question, text }];
	});
}
