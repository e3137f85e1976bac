import type { FindingAs, FindingMistake, Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord, EmissionsAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise, EmissionsQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { sweptPlot } from '$lib/server/bench/grading/swept-plot';
import type { Judged } from '../question-type';
import { matchRows, type Matched } from './match-rows';

interface Fault extends FindingMistake {
	/** In a few words, at the row. */
	brief: string;
}
const frequency = (hz: number) => quantityText(hz, 'Hz');
const level = (dbm: number) => quantityText(dbm, 'dBm');

/** What is wrong with one emission's row. */
function faultOf(
	{ emission, row }: Matched['pairs'][number],
	{ toleranceDb }: EmissionsQuestion
): Fault | null {
	const { id, name, atHz, levelDbm, breaks } = emission;
	const where = `${name}, at ${frequency(atHz)}`;
	if (!row) {
		const text = `It stands at ${level(levelDbm)}, and your table doesn’t have it.`;
		return { kind: `missing-${id}`, title: `You missed ${where}`, text, brief: 'missed' };
	}
	const offDb = row.levelDbm - levelDbm;
	if (Math.abs(offDb) > toleranceDb) {
		const side = offDb < 0 ? 'low' : 'high';
		const off = quantityText(Math.abs(offDb), 'dB');
		const text = `You have ${level(row.levelDbm)}; it is ${level(levelDbm)}.`;
		return {
			kind: `level-${id}`,
			title: `The level of ${where}, is ${off} too ${side}`,
			text,
			brief: `${off} too ${side}`
		};
	}
	if (breaks !== null && row.breaks !== breaks) {
		const text = breaks ? 'It stands above its limit.' : 'It stays below its limit.';
		return {
			kind: `limit-${id}`,
			title: `The verdict on ${where}, is the other one`,
			text,
			brief: 'wrong verdict'
		};
	}
	return null;
}

function strangerOf({ row, ghost }: Matched['strangers'][number], index: number): Fault {
	if (ghost) return { kind: ghost.id, title: ghost.title, text: ghost.text, brief: 'not of the signal' };
	const title = `Nothing stands at ${frequency(row.atHz)}`;
	return {
		kind: `invented-${index + 1}`,
		title,
		text: 'No emission is there that this table asks for.',
		brief: 'invented'
	};
}

/** Right when every emission has its row, every row its emission, and each level and verdict is right. */
export function judgeEmissions(
	drawn: DrawnExercise,
	question: EmissionsQuestion,
	record: AttemptRecord
): Judged {
	const answer = record.answers[question.id] as EmissionsAnswer | undefined;
	const { pairs, strangers } = matchRows(question, answer?.rows ?? []);
	const ofPairs = pairs.map((pair) => faultOf(pair, question));
	const ofStrangers = strangers.map(strangerOf);
	const faults = answer ? [...ofPairs, ...ofStrangers].filter((fault) => fault !== null) : [];
	const verdict: Verdict = !answer ? 'unanswered' : faults.length > 0 ? 'wrong' : 'right';
	const rows: FindingAs<'emissions'>['rows'] = [
		...pairs.map(({ emission: { name, atHz, levelDbm, breaks }, row }, i) => ({
			name,
			yours: row,
			true: { atHz, levelDbm, breaks },
			fault: answer ? (ofPairs[i]?.brief ?? null) : null
		})),
		...strangers.map(({ row }, i) => ({ name: null, yours: row, true: null, fault: ofStrangers[i].brief }))
	];
	return {
		finding: {
			type: 'emissions',
			id: question.id,
			text: question.text,
			verdict,
			title: titleOf(verdict, faults, question.emissions.length),
			answer: answer ? `${answer.rows.length} ${answer.rows.length === 1 ? 'row' : 'rows'}` : null,
			mistakes: faults.map(({ kind, title, text }) => ({ kind, title, text })),
			remarks: [],
			plot: sweptPlot(drawn, record.log),
			rows,
			asksBreaks: question.asksBreaks
		},
		blames: faults.map(({ title }) => ({ question: question.id, text: title }))
	};
}

function titleOf(verdict: Verdict, faults: readonly Fault[], emissions: number): string {
	if (verdict === 'unanswered') return 'Your table is empty.';
	if (verdict === 'right')
		return emissions === 1
			? 'The one emission is there, and nothing else.'
			: `All ${emissions} emissions are there, and nothing else.`;
	return faults.length === 1 ? `${faults[0].title}.` : `${faults.length} things in your table are wrong.`;
}
