import type { FindingLadder, FindingMistake, NumberFinding } from '$lib/schemas/questions/finding';
import type { SettingsLogEntry } from '../exercise/attempt-record';
import { accountFor, type Account } from './account-for';
import { isAbsoluteLevel } from './asked';
import { askedName } from './describe-reading';
import type { Judgement } from './judge-question';
import { numberLine } from './number-line';
import { questionPlot } from './question-plot';
import { questionTitle } from './question-title';
import { said } from './said';
import { shownDigits } from './spreads';

export interface ExplainedQuestion {
	finding: NumberFinding;
	accounts: Account[];
}

function ladderOf({ evidence }: Judgement, accounts: readonly Account[], yours: number): FindingLadder {
	const { question, drawn } = evidence;
	const { unit, truth, leadDb } = question;
	const name = askedName(question);
	const levels = [{ value: truth, text: `${name} at ${drawn.brief.plane}` }];
	if (isAbsoluteLevel(unit) && leadDb !== 0) {
		levels.push({ value: truth - leadDb, text: `${name} at the receiver` });
	}
	const unexplained = [{ from: yours, to: truth, change: truth - yours, text: 'not explained' }];
	const parts = accounts.map(({ from, to, change, text }) => ({ from, to, change, text }));
	return { unit, yours, true: truth, parts: parts.length > 0 ? parts : unexplained, levels };
}

const mistakeOf = ({ watched, explanation }: Account): FindingMistake[] => {
	if (!watched || !explanation) return [];
	const { title, text, sum, note } = explanation;
	return [{ kind: watched.kind, title, text, ...(sum && { sum }), ...(note && { note }) }];
};

/** A judgement in words and numbers, as the finding's page shows it. */
export function explainQuestion(judgement: Judgement, log: readonly SettingsLogEntry[]): ExplainedQuestion {
	const { evidence, verdict, matched, difference, remarks } = judgement;
	const { question, answer } = evidence;
	const accounts = matched && answer ? accountFor(judgement, matched, answer.value) : [];
	const measured = (value: number) => ({ value, unit: question.unit, digits: shownDigits(question) });
	return {
		accounts,
		finding: {
			type: 'number',
			id: question.id,
			text: question.text,
			verdict,
			title: questionTitle(judgement),
			answer: answer ? said(answer.value, question) : null,
			yours: answer ? measured(answer.value) : null,
			true: measured(question.truth),
			difference,
			tolerance: question.tolerance,
			mistakes: accounts.flatMap(mistakeOf),
			remarks,
			ladder: verdict === 'wrong' && answer ? ladderOf(judgement, accounts, answer.value) : null,
			numberLine: numberLine(judgement),
			plot: questionPlot(judgement, log)
		}
	};
}
