import type { Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, MarkAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise, MarkQuestion, Places } from '$lib/server/bench/exercise/drawn-exercise';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { displayedHz } from '$lib/server/bench/grading/displayed';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';
import { placeWords } from './place-words';

/** The farther of the distances between two flags, or between the edges of two bands, Hz. */
const apartHz = (a: Places, b: Places): number =>
	Math.max(Math.abs(a.atHz - b.atHz), Math.abs((a.toHz ?? 0) - (b.toHz ?? 0)));

/** Right when every place is within the tolerance. What is marked is marked on the screen: the receiver's own error is taken off. */
export function judgeMark(drawn: DrawnExercise, question: MarkQuestion, record: AttemptRecord): Judged {
	const answer = record.answers[question.id] as MarkAnswer | undefined;
	const perHz = displayedHz({ drawn }, 1);
	const yours: Places | null = answer
		? { atHz: answer.atHz / perHz, ...(answer.toHz !== undefined && { toHz: answer.toHz / perHz }) }
		: null;
	const { truth, toleranceHz, shape } = question;
	const isRight = yours !== null && apartHz(yours, truth) <= toleranceHz;
	const verdict: Verdict = !yours ? 'unanswered' : isRight ? 'right' : 'wrong';
	const found =
		yours && !isRight
			? question.mistakes
					.filter((mistake) => apartHz(yours, mistake) <= toleranceHz)
					.sort((a, b) => apartHz(yours, a) - apartHz(yours, b))
					.at(0)
			: undefined;
	const words = answer ? placeWords(answer, toleranceHz) : null;
	return {
		finding: {
			type: 'mark',
			id: question.id,
			text: question.text,
			verdict,
			title: found ? `${found.title}.` : titleOf(verdict, yours, question),
			answer: words,
			mistakes: found ? [{ kind: found.id, title: found.title, text: found.text }] : [],
			remarks: [],
			plot: {
				...sweptPlot(drawn, record.log),
				at: shape === 'flag' ? { frequencyHz: truth.atHz, text: 'true place' } : null,
				band:
					truth.toHz === undefined
						? null
						: {
								startHz: truth.atHz,
								stopHz: truth.toHz,
								value: truth.toHz - truth.atHz,
								unit: 'Hz',
								text: 'true band'
							}
			},
			yours,
			true: truth,
			toleranceHz
		},
		blames: verdict === 'wrong' ? [{ question: question.id, text: found?.title ?? 'marked elsewhere' }] : []
	};
}

function titleOf(
	verdict: Verdict,
	yours: Places | null,
	{ shape, truth, toleranceHz }: MarkQuestion
): string {
	if (verdict === 'unanswered' || !yours) return 'You marked nothing.';
	if (verdict === 'right')
		return shape === 'flag' ? 'The mark stands where it belongs.' : 'The band reaches where it belongs.';
	const digits = 0 - Math.floor(Math.log10(toleranceHz / 10) + 1e-9);
	const off = quantityText(apartHz(yours, truth), 'Hz', digits);
	if (shape === 'band') return `An edge of your band is ${off} off.`;
	return `Your mark stands ${off} too far ${yours.atHz < truth.atHz ? 'down' : 'up'}.`;
}
