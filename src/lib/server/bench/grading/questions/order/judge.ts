import type { Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, OrderAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise, OrderQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';

/** Of the mistakes watched, those whose two items are not in their true order. */
export function inverted(
	{ items, truth, mistakes }: OrderQuestion,
	order: readonly string[]
): OrderQuestion['mistakes'] {
	const keyOf = (id: string) => items.find((item) => item.id === id)?.key ?? '';
	return mistakes.filter((mistake) => {
		const [a, b] = mistake.items.map(keyOf);
		return truth.indexOf(a) < truth.indexOf(b) !== order.indexOf(a) < order.indexOf(b);
	});
}

/** Right when every item stands in its place. */
export function judgeOrder(drawn: DrawnExercise, question: OrderQuestion, record: AttemptRecord): Judged {
	const answer = record.answers[question.id] as OrderAnswer | undefined;
	const textOf = (key: string) => question.items.find((item) => item.key === key)?.text ?? key;
	const given = answer?.order ?? [];
	const wrong = question.truth.findIndex((key, i) => given[i] !== key);
	const verdict: Verdict = !answer ? 'unanswered' : wrong < 0 ? 'right' : 'wrong';
	// The first two neighbours of the true order that stand the other way about.
	const turned = question.truth.findIndex(
		(key, i) => i > 0 && given.indexOf(question.truth[i - 1]) > given.indexOf(key)
	);
	const says =
		turned > 0
			? `“${textOf(question.truth[turned - 1])}” belongs before “${textOf(question.truth[turned])}”`
			: '';
	const mistakes = verdict === 'wrong' ? inverted(question, given) : [];
	return {
		finding: {
			type: 'order',
			id: question.id,
			text: question.text,
			verdict,
			title:
				verdict === 'unanswered'
					? 'You put nothing in order.'
					: verdict === 'right'
						? 'Everything stands in its place.'
						: `${says}.`,
			answer: answer ? given.map(textOf).join(', ') : null,
			mistakes: mistakes.map(({ id, title, text }) => ({ kind: id, title, text })),
			remarks: [],
			plot: sweptPlot(drawn, record.log),
			yours: answer ? given.map(textOf) : null,
			true: question.truth.map(textOf)
		},
		blames: verdict === 'wrong' ? [{ question: question.id, text: says }] : []
	};
}
