import type { FindingMistake, Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, UncertaintyAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise, UncertaintyQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { shortFigure } from '$lib/server/bench/exercise/figure';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';
import { knownSlips } from './known-slips';
import { combined } from './standard';

/** How near a stated uncertainty must be to what a slip gives, to be that slip: figures are rounded. */
const LIKE = 0.06;
const USUAL_K = 2;
const db = (value: number): string => `${shortFigure(value, 2)} dB`;

/** Right when the value is, and the uncertainty is what the budget gives with the coverage factor stated. */
export function judgeUncertainty(
	drawn: DrawnExercise,
	question: UncertaintyQuestion,
	record: AttemptRecord
): Judged {
	const answer = record.answers[question.id] as UncertaintyAnswer | undefined;
	const { truth, unit, digits, toleranceDb, budget } = question;
	const reading = record.readings.find(({ id }) => id === answer?.readingId)?.reading;
	const spreadDb = reading?.unit.startsWith('dB') ? reading.spread : question.spreadDb;
	const combinedDb = combined([...budget.map(({ standardDb }) => standardDb), spreadDb]);
	const k = answer?.k ?? USUAL_K;
	const expandedDb = k * combinedDb;
	const mistakes = answer
		? [...valueMistakes(answer, question), ...uncertaintyMistakes(answer, question, spreadDb, expandedDb)]
		: [];
	const verdict: Verdict = !answer ? 'unanswered' : mistakes.length > 0 ? 'wrong' : 'right';
	const measured = (value: number) => ({ value, unit, digits });
	return {
		finding: {
			type: 'uncertainty',
			id: question.id,
			text: question.text,
			verdict,
			title:
				verdict === 'unanswered'
					? 'You stated nothing.'
					: verdict === 'right'
						? 'The value is right, and so is what you say of it.'
						: `${mistakes[0].title}.`,
			answer: answer
				? `${quantityText(answer.stated, unit, digits)} ± ${db(answer.expandedDb)}, k = ${shortFigure(k, 2)}`
				: null,
			mistakes,
			remarks:
				answer && !reading
					? [
							{
								code: 'no-evidence',
								text: 'No reading is attached: the budget takes the spread of one taken as taught.'
							}
						]
					: [],
			plot: sweptPlot(drawn, record.log),
			yours: answer ? { value: measured(answer.stated), expandedDb: answer.expandedDb, k } : null,
			true: measured(truth),
			toleranceDb,
			budget: [
				...budget.map((one) => ({ text: one.text, db: one.db, standardDb: one.standardDb })),
				{ text: 'spread of the reading', db: spreadDb, standardDb: spreadDb }
			],
			combinedDb,
			expandedDb
		},
		blames: mistakes.map(({ title }) => ({ question: question.id, text: title }))
	};
}

function valueMistakes(
	{ stated }: UncertaintyAnswer,
	{ truth, toleranceDb, leadDb }: UncertaintyQuestion
): FindingMistake[] {
	const offDb = stated - truth;
	if (Math.abs(offDb) <= toleranceDb) return [];
	if (leadDb > toleranceDb && Math.abs(offDb + leadDb) <= toleranceDb) {
		const text = 'Your value is right at the receiver. What the lead loses belongs back on top of it.';
		return [
			{ kind: 'lead-left-out', title: 'The lead was left out', text, sum: `${db(leadDb)} lost on the way` }
		];
	}
	const title = `The value is ${db(Math.abs(offDb))} too ${offDb < 0 ? 'low' : 'high'}`;
	return [{ kind: 'value-off', title, text: 'No uncertainty makes up for a value that is wrong.' }];
}

function uncertaintyMistakes(
	answer: UncertaintyAnswer,
	question: UncertaintyQuestion,
	spreadDb: number,
	expandedDb: number
): FindingMistake[] {
	const share = answer.expandedDb / expandedDb - 1;
	if (Math.abs(share) <= question.within) return [];
	const away = (other: number) => Math.abs(answer.expandedDb / other - 1);
	const [slip] = knownSlips(question, spreadDb, answer.k)
		.filter((one) => away(one.expandedDb) <= LIKE)
		.sort((a, b) => away(a.expandedDb) - away(b.expandedDb));
	const sum = `${db(answer.expandedDb)} stated; the budget gives ${db(expandedDb)} with k = ${shortFigure(answer.k, 2)}`;
	if (slip) return [{ kind: slip.kind, title: slip.title, text: slip.text, sum }];
	return share < 0
		? [
				{
					kind: 'understated',
					title: 'The uncertainty is understated',
					text: 'You promise more than your receiver and your reading can keep.',
					sum
				}
			]
		: [
				{
					kind: 'overstated',
					title: 'The uncertainty is overstated',
					text: 'A result that is said to be worse than it is decides nothing.',
					sum
				}
			];
}
